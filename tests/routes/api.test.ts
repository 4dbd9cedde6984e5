import { RouterContextProvider } from "react-router";
import { expect, test } from "vitest";
import type { AppContext } from "#app/features/app-context.ts";
import { action as density } from "#app/routes/api/density.ts";
import { action as rotationFit } from "#app/routes/api/rotation-fit.ts";
import { fitRotation } from "#app/gemmology/rotation/fit-rotation.ts";
import { appContext } from "#app/web/contexts.server.ts";
import { anApp } from "../setup/an-app.ts";

async function post(route: unknown, app: AppContext, body: unknown) {
  const context = new RouterContextProvider();
  context.set(appContext, app);
  const request = new Request("http://127.0.0.1:3000/api/v1/x", { method: "POST", headers: { "Content-Type": "application/json" }, body: JSON.stringify(body) });
  const response = (await (route as (args: unknown) => Promise<Response>)({ request, context, params: {} })) as Response;
  return { response, json: (await response.json()) as Record<string, unknown> };
}

test("a density comes with its budget, and with a warning where the stone is too small", async () => {
  const app = await anApp();
  const large = await post(density, app, { massAirCt: 5.216, massLiquidCt: 3.914, tempC: 21.5 });
  expect(large.json).toMatchObject({ sg: expect.closeTo(3.994, 3), uSg: expect.closeTo(0.0128, 3), warning: null });
  const small = await post(density, app, { massAirCt: 0.25, massLiquidCt: 0.156, tempC: 20 });
  expect(small.json.warning).toMatch(/^Too small for this balance/);
});

test("a rotation run over HTTP is fitted by the same function", async () => {
  const readings = [0, 30, 60, 90, 120, 150].map((angleDeg, at) => ({ angleDeg, upper: 1.64, lower: [1.635, 1.6312, 1.6237, 1.62, 1.6237, 1.6312][at]!, u: 0.0005, polariserDeg: null }));
  const run = { facets: [{ label: "table", readings }] };
  const { response, json } = await post(rotationFit, await anApp(), run);
  expect(response.status).toBe(200);
  expect(json).toEqual(JSON.parse(JSON.stringify(fitRotation(run))));
});

test("two readings are no run: a problem that says so", async () => {
  const { response, json } = await post(rotationFit, await anApp(), { facets: [{ label: "table", readings: [{ angleDeg: 0, upper: 1.6 }, { angleDeg: 30, upper: 1.6 }] }] });
  expect(response.status).toBe(422);
  expect(response.headers.get("content-type")).toContain("application/problem+json");
  expect(json.detail).toMatch(/at least three/);
});

test("asked too often from one address, both refuse with the time to wait", async () => {
  const app = await anApp();
  let refused: Response | null = null;
  for (let ask = 0; ask < 2_000 && !refused; ask++) {
    const { response } = await post(ask % 2 === 0 ? density : rotationFit, app, {});
    if (response.status === 429) refused = response;
  }
  expect(refused).not.toBeNull();
  expect(Number(refused!.headers.get("Retry-After"))).toBeGreaterThan(0);
});
