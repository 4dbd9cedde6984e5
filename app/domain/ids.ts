declare const idOf: unique symbol;

/** A row id: UUIDv7 in canonical lower-case text; 16 bytes in the database. People never see one. */
export type Id<Noun extends string> = string & { readonly [idOf]: Noun };

export type LaboratoryId = Id<"laboratory">;
export type UserId = Id<"user">;
export type ClientId = Id<"client">;
export type TakeInId = Id<"takeIn">;
export type ItemId = Id<"item">;
export type StoneId = Id<"stone">;
export type InstrumentId = Id<"instrument">;
export type InstrumentCheckId = Id<"instrumentCheck">;
export type InstrumentCorrectionId = Id<"instrumentCorrection">;
export type ReferenceMaterialId = Id<"referenceMaterial">;
export type ObservationId = Id<"observation">;
export type AttachmentId = Id<"attachment">;
export type SpectrumId = Id<"spectrum">;
export type InclusionId = Id<"inclusion">;
export type ConclusionId = Id<"conclusion">;
export type SecondCheckId = Id<"secondCheck">;
export type ValuationId = Id<"valuation">;
export type PriceId = Id<"price">;
export type InvoiceId = Id<"invoice">;
export type PaymentId = Id<"payment">;
export type ReportId = Id<"report">;
export type MailId = Id<"mail">;

const canonical = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/;

/** Whether a text from outside has the shape of a row id; says nothing about whether such a row exists. */
export function isId(text: string): boolean {
  return canonical.test(text);
}
