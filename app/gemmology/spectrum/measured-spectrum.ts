/** What the horizontal axis counts; wavelengths in nm or µm, wavenumbers in cm⁻¹. */
export type XUnit = "nm" | "um" | "1/cm";
/** What was measured. Transmittance and reflectance are shares, 1 for all the light; arbitrary units have no zero that could be trusted. */
export type YUnit = "absorbance" | "transmittance" | "reflectance" | "arbitrary";

/** A spectrum as its file gives it: every abscissa once, rising or falling throughout, in the file's own unit. */
export type MeasuredSpectrum = Readonly<{
  format: "jcampDx" | "twoColumns";
  title: string;
  /** A curve, or only the peaks that somebody else picked. */
  kind: "curve" | "peakTable";
  xUnit: XUnit;
  yUnit: YUnit;
  /** True where the file does not say its units, so that what the reader was told to assume stands here. */
  isUnitAssumed: boolean;
  xs: readonly number[];
  ys: readonly number[];
  /** What a person should know of how the file was read, a sentence each. */
  notes: readonly string[];
}>;

/** Why a file is no spectrum: a sentence, and the line that it speaks of (1 is the first), where it is about one. */
export type SpectrumProblem = Readonly<{ line: number | null; message: string }>;
export type ReadSpectrum = Readonly<{ ok: true; spectrum: MeasuredSpectrum }> | Readonly<{ ok: false; problem: SpectrumProblem }>;

/** What to take the two columns for where the file itself does not say. */
export type AssumedUnits = Readonly<{ xUnit: XUnit; yUnit: YUnit }>;

/** Thrown inside the readers, caught at their edge. */
export class SpectrumFileError extends Error {
  readonly line: number | null;
  constructor(line: number | null, message: string) {
    super(message);
    this.line = line;
  }
}
