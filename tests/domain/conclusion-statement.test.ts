import { expect, test } from "vitest";
import { confidences, natures, type TreatmentFinding } from "#app/domain/conclusion.ts";
import { conclusionStatement } from "#app/domain/conclusion-statement.ts";

const ruby = { speciesName: "Corundum", variety: "Ruby", nature: "natural", confidence: "identified", treatments: [] as TreatmentFinding[] } as const;
const finding = (code: TreatmentFinding["code"], status: TreatmentFinding["status"]): TreatmentFinding => ({ code, status, extent: null, evidence: "" });

test("an unqualified name is left to the natural stone", () => {
  expect(conclusionStatement(ruby).title).toBe("Ruby");
});

// 16 CFR 23.25(b): "synthetic" must stand with equal conspicuousness, so it stands in the title.
test("a synthetic is called so in the title", () => {
  expect(conclusionStatement({ ...ruby, nature: "synthetic" }).title).toBe("Synthetic ruby");
});

test.each(natures.filter((nature) => nature !== "natural" && nature !== "organic"))("nature “%s” never leaves the plain name alone", (nature) => {
  expect(conclusionStatement({ ...ruby, nature }).title).not.toBe("Ruby");
});

test("indications of a treatment are told with the identity", () => {
  expect(conclusionStatement({ ...ruby, treatments: [finding("heating", "indications")] }).statements[0]).toBe("Natural corundum, with indications of heating.");
});

test("a filling that changes what it may be called stands in the title", () => {
  expect(conclusionStatement({ ...ruby, treatments: [finding("glassFilling", "detected")] }).title).toBe("Ruby, filled with glass");
});

test("what was looked for and not found is not told as found", () => {
  const { title, statements } = conclusionStatement({ ...ruby, treatments: [finding("glassFilling", "notDetected"), finding("latticeDiffusion", "notDeterminable")] });
  expect(`${title} ${statements.join(" ")}`).not.toMatch(/glass|diffusion/i);
});

test("without an identity there is no name in the title", () => {
  expect(conclusionStatement({ ...ruby, confidence: "notDetermined" })).toEqual({ title: "Identity not determined", statements: ["The tests listed do not determine what the stone is."] });
});

test.each(confidences)("the confidence “%s” is said in a sentence", (confidence) => {
  expect(conclusionStatement({ ...ruby, confidence }).statements.at(-1)).toMatch(/^(The tests|Identified)/);
});

test("undetermined nature is said twice: in the title and in words", () => {
  const { title, statements } = conclusionStatement({ ...ruby, nature: "undetermined" });
  expect(title).toBe("Ruby, nature not determined");
  expect(statements[0]).toMatch(/not determined/);
});
