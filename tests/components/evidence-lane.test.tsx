import { renderToStaticMarkup } from "react-dom/server";
import { expect, test } from "vitest";
import { EvidenceLane } from "#app/components/charts/evidence-lane.tsx";

const density = { label: "Density", referenceLow: 3.95, referenceHigh: 4.05, referenceText: "3.95–4.05", axisMin: 3, axisMax: 5 };
const words = (markup: string) => markup.replace(/<[^>]+>/g, "");

test("a lane says its verdict, the measured value and the species' range in words", () => {
  const text = words(renderToStaticMarkup(<EvidenceLane {...density} observed={3.997} u={0.021} verdict="agrees" />));
  expect(text).toBe("Densitymeasured 3.997, species 3.95–4.05agrees");
});

test("the tick stands where the value lies, its whisker reaches two standard uncertainties", () => {
  const markup = renderToStaticMarkup(<EvidenceLane {...density} observed={4} u={0.1} verdict="agrees" />);
  // The lane keeps 3 % free at either end: 3 + 94 × (4 − 3) / 2 = 50, and ±0.2 is ±9.4.
  expect(markup).toContain('x1="50.00%" x2="50.00%"');
  expect(markup).toContain('x1="40.60%" x2="59.40%"');
});

test("a value beyond the lane is an arrow, not a tick at its end", () => {
  const markup = renderToStaticMarkup(<EvidenceLane {...density} observed={6.1} u={0.02} verdict="contradicts" />);
  expect(markup).not.toContain('x1="97.00%" x2="97.00%"');
  expect(markup).toContain("m-7 4 4 4-4 4");
});

test("a test that was not made is said so", () => {
  expect(words(renderToStaticMarkup(<EvidenceLane {...density} />))).toContain("not tested");
});
