// Lets the pages of stones on the bench open without the line. Nothing but those pages, and the files they are made of,
// is kept; all of it goes when somebody signs out, and pages after twelve hours.
const pages = "bench-pages-1";
const files = "bench-files-1";
const keptForMs = 12 * 60 * 60 * 1000;
const benchPath = /^\/lab\/[^/]+\/stones\/[^/]+$/;
const isFile = ({ pathname }) => pathname.startsWith("/assets/") || pathname.startsWith("/species-table/") || pathname === "/favicon.svg" || pathname === "/favicon.ico";
const isPhoto = ({ pathname }) => /^\/lab\/[^/]+\/photos\//.test(pathname);

self.addEventListener("install", () => self.skipWaiting());
self.addEventListener("activate", (event) => {
  event.waitUntil(
    (async () => {
      for (const name of await caches.keys()) if (name.startsWith("bench-") && name !== pages && name !== files) await caches.delete(name);
      await self.clients.claim();
    })(),
  );
});

self.addEventListener("message", (event) => {
  const { keep } = event.data ?? {};
  if (Array.isArray(keep)) event.waitUntil(keepAll(keep.filter((url) => typeof url === "string")));
});

self.addEventListener("fetch", (event) => {
  const { request } = event;
  const url = new URL(request.url);
  if (url.origin !== self.location.origin) return;
  if (request.method === "POST" && url.pathname === "/sign-out") event.waitUntil(forget());
  if (request.method !== "GET") return;
  if (isFile(url)) event.respondWith(fileFirst(request));
  else if (isPhoto(url)) event.respondWith(lineFirst(request, url.pathname + url.search));
  else if (request.mode === "navigate" && url.pathname.startsWith("/lab/")) event.respondWith(pageOf(request, url));
});

async function keepAll(urls) {
  for (const address of new Set(urls)) {
    const url = new URL(address, self.location.origin);
    if (url.origin !== self.location.origin) continue;
    try {
      if (isFile(url)) await fileFirst(new Request(url));
      else if (isPhoto(url)) await lineFirst(new Request(url), url.pathname + url.search);
      else if (benchPath.test(url.pathname)) await keepPage(await fetch(url, { credentials: "same-origin", headers: { Accept: "text/html" } }), url);
    } catch {
      // Kept another time.
    }
  }
}

async function fileFirst(request) {
  const kept = await caches.match(request, { cacheName: files });
  if (kept) return kept;
  const response = await fetch(request);
  if (response.ok) await (await caches.open(files)).put(request, response.clone());
  return response;
}

async function lineFirst(request, key) {
  try {
    const response = await fetch(request);
    if (response.ok) await (await caches.open(pages)).put(key, response.clone());
    return response;
  } catch (error) {
    const kept = await caches.match(key, { cacheName: pages });
    if (kept) return kept;
    throw error;
  }
}

async function keepPage(response, url) {
  if (response.ok && !response.redirected && (response.headers.get("Content-Type") ?? "").startsWith("text/html")) {
    await (await caches.open(pages)).put(url.pathname, response.clone());
  }
  return response;
}

async function pageOf(request, url) {
  try {
    const response = await fetch(request);
    return benchPath.test(url.pathname) ? await keepPage(response, url) : response;
  } catch {
    const kept = await caches.match(url.pathname, { cacheName: pages });
    if (kept && Date.now() - new Date(kept.headers.get("Date") ?? 0).getTime() < keptForMs) return kept;
    return offlinePage();
  }
}

async function forget() {
  await caches.delete(pages);
  await new Promise((resolve) => {
    const opening = indexedDB.open("isogyre-bench");
    opening.onerror = resolve;
    opening.onsuccess = () => {
      const db = opening.result;
      if (!db.objectStoreNames.contains("pages")) return resolve(db.close());
      const write = db.transaction("pages", "readwrite");
      write.objectStore("pages").clear();
      write.oncomplete = write.onabort = () => resolve(db.close());
    };
    // Not made by us: the page makes the store, with its shape.
    opening.onupgradeneeded = () => opening.transaction.abort();
  });
}

async function offlinePage() {
  const kept = [];
  for (const request of await (await caches.open(pages)).keys()) {
    const { pathname } = new URL(request.url);
    if (benchPath.test(pathname)) kept.push(pathname);
  }
  const items = kept.map((path) => `<li><a href="${encodeURI(path)}">${escapeText(path.split("/").at(-1))}</a></li>`).join("");
  const body = `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1"><title>No line · Isogyre</title></head><body><h1>No line</h1><p>This page needs the line. ${kept.length > 0 ? "These stones open without it; what you record there waits on this device and is sent when the line is back." : "No stone's page is kept on this device yet: open one while there is a line."}</p><ul>${items}</ul></body></html>`;
  return new Response(body, { status: 503, headers: { "Content-Type": "text/html; charset=utf-8", "Content-Security-Policy": "default-src 'none'", "Cache-Control": "no-store" } });
}

const escapeText = (text) => text.replace(/[&<>"]/g, (mark) => ({ "&": "&amp;", "<": "&lt;", ">": "&gt;", '"': "&quot;" })[mark]);
