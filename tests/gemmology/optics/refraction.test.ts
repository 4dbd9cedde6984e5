import { expect, test } from "vitest";
import { criticalAngleDeg } from "#app/gemmology/optics/critical-angle-deg.ts";
import { indexFromCriticalAngle } from "#app/gemmology/optics/index-from-critical-angle.ts";
import { refractionAngleDeg } from "#app/gemmology/optics/refraction-angle-deg.ts";
import { workedOn } from "../worked-on.ts";

test("light from air into quartz at 45° is bent to 27.251° (Snell's law, computed by hand from sin 45°/1.5443)", () => {
  expect(refractionAngleDeg({ n1: 1, n2: 1.5443, incidenceDeg: 45 })).toBeCloseTo(27.251, 3);
});

test("beyond the critical angle nothing is refracted", () => {
  expect(refractionAngleDeg({ n1: 1.5443, n2: 1, incidenceDeg: 45 })).toBeNull();
});

// Published to a tenth or a hundredth of a degree; one source rounds 24.44° to a half.
test.each(workedOn("critical angle to air", "critical angle (diamond), gem textbook value"))("$id: critical angle in air ($source)", ({ inputs, expected }) => {
  const published = expected.critical_angle_deg!;
  const tolerance = published === 24.5 ? 0.07 : Number.isInteger(published * 10) ? 0.051 : 0.0051;
  expect(Math.abs(criticalAngleDeg({ nDense: inputs.ri! }) - published)).toBeLessThanOrEqual(tolerance);
});

test.each(workedOn("critical angle between two media"))("$id: critical angle between two media ($source)", ({ inputs, expected }) => {
  expect(Math.abs(criticalAngleDeg({ nDense: inputs.n_dense!, nRare: inputs.n_rare! }) - expected.critical_angle_deg!)).toBeLessThanOrEqual(0.051);
});

test("the critical angle is where the refracted ray grazes", () => {
  const critical = criticalAngleDeg({ nDense: 1.762, nRare: 1.333 });
  expect(refractionAngleDeg({ n1: 1.762, n2: 1.333, incidenceDeg: critical - 1e-7 })).toBeGreaterThan(89.9);
});

test("an edge at 55.227° in a prism of 1.8800 means 1.5443 ± 0.0007", () => {
  const { n, u } = indexFromCriticalAngle({ angleDeg: 55.227, prismN: 1.88 });
  expect(n).toBeCloseTo(1.5443, 4);
  expect(u).toBeCloseTo(0.0007, 4);
});

test.each([0, 90, -1, Number.NaN, 10 ** 9])("an angle of %s° is refused", (angleDeg) => {
  expect(() => indexFromCriticalAngle({ angleDeg, prismN: 1.88 })).toThrow(RangeError);
});

test("an index below 1 is refused by name", () => {
  expect(() => indexFromCriticalAngle({ angleDeg: 20, prismN: 1.88 })).toThrow(/n out of range/);
});

test.each(workedOn("Snell").filter(({ inputs }) => inputs.n2 !== undefined && inputs.angle1_deg !== undefined))("$id: refraction ($source)", ({ inputs, expected }) => {
  // The source prints whole degrees.
  expect(Math.abs(refractionAngleDeg({ n1: inputs.n1!, n2: inputs.n2!, incidenceDeg: inputs.angle1_deg! })! - expected.angle2_deg!)).toBeLessThanOrEqual(0.51);
});
