import { clip, endPath, PDFName, PDFOperator, PDFOperatorNames, popGraphicsState, pushGraphicsState, rectangle, type PDFDocument, type PDFPage, type PDFRef } from "pdf-lib";
import { interferenceColour } from "#app/domain/interference-colour.ts";

const steps = 256;
const mostNm = 1800;
const shadingName = PDFName.of("Ramp");
let samples: Uint8Array | undefined;

/** The colours of a wedge, R = 0 to 1800 nm, as one shading that all pages of a document share. */
export function embedRamp(pdf: PDFDocument, { width }: { width: number }): PDFRef {
  samples ??= Uint8Array.from(
    Array.from({ length: steps }, (_, i) => interferenceColour((mostNm * i) / (steps - 1))).flatMap(({ red, green, blue }) => [red, green, blue]),
    (part) => Math.round(part * 255),
  );
  const { context } = pdf;
  const colours = context.register(context.flateStream(samples, { FunctionType: 0, Domain: [0, 1], Size: [steps], BitsPerSample: 8, Range: [0, 1, 0, 1, 0, 1] }));
  return context.register(context.obj({ ShadingType: 2, ColorSpace: "DeviceRGB", Coords: [0, 0, width, 0], Function: colours }));
}

export function drawRamp(page: PDFPage, ramp: PDFRef, { height }: { height: number }): void {
  page.node.normalizedEntries().Resources.set(PDFName.of("Shading"), page.doc.context.obj({ Ramp: ramp }));
  page.pushOperators(
    pushGraphicsState(),
    rectangle(0, page.getHeight() - height, page.getWidth(), height),
    clip(),
    endPath(),
    PDFOperator.of(PDFOperatorNames.ShadingFill, [shadingName]),
    popGraphicsState(),
  );
}
