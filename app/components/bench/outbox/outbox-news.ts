const channelName = "isogyre-bench-outbox";
const here = new EventTarget();
let channel: BroadcastChannel | undefined;

function theChannel(): BroadcastChannel {
  if (!channel) {
    channel = new BroadcastChannel(channelName);
    channel.onmessage = () => here.dispatchEvent(new Event("change"));
  }
  return channel;
}

/** Tells this page and the others of this browser that what waits has changed. */
export function announceOutbox(): void {
  here.dispatchEvent(new Event("change"));
  theChannel().postMessage("change");
}

export function onOutboxChange(listener: () => void): () => void {
  theChannel();
  here.addEventListener("change", listener);
  return () => here.removeEventListener("change", listener);
}
