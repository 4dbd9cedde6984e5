import { SpectrumFileError, type AssumedUnits, type ReadSpectrum } from "./measured-spectrum.ts";
import { readJcampDx } from "./read-jcamp-dx.ts";
import { readTwoColumns } from "./read-two-columns.ts";
import { mostSpectrumCharacters, mostSpectrumLineCharacters } from "./spectrum-limits.ts";

/**
 * The spectrum in a file's text, JCAMP-DX or two columns as its first characters show, or why there is none.
 * Never throws for what the text holds.
 */
export function readSpectrumFile(text: string, assumed: AssumedUnits): ReadSpectrum {
  const refuse = (line: number | null, message: string): ReadSpectrum => ({ ok: false, problem: { line, message } });
  if (text.length > mostSpectrumCharacters) return refuse(null, `This file has more than ${mostSpectrumCharacters / 1e6} million characters. Save the spectrum at a wider step.`);
  const plain = text.replace(/^\uFEFF/, "");
  if (plain.trim() === "") return refuse(null, "This file is empty.");
  if (/[\u0000-\u0008\u000E-\u001F]/.test(plain.replace(/\u001A\s*$/, ""))) return refuse(null, "This is no text file. Save the spectrum as JCAMP-DX or as a table of two columns.");
  const lines = plain.replace(/\u001A\s*$/, "").split(/\r\n|\n|\r/);
  const long = lines.findIndex((line) => line.length > mostSpectrumLineCharacters);
  if (long >= 0) return refuse(long + 1, `This line has more than ${mostSpectrumLineCharacters.toLocaleString("en")} characters; no spectrum's has.`);
  try {
    const isJcampDx = lines.find((line) => line.trim() !== "" && !line.trimStart().startsWith("$$"))?.trimStart().startsWith("##");
    return { ok: true, spectrum: isJcampDx ? readJcampDx(lines, assumed) : readTwoColumns(lines, assumed) };
  } catch (error) {
    if (error instanceof SpectrumFileError) return refuse(error.line, error.message);
    throw error;
  }
}
