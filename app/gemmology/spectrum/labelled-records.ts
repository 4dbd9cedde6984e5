import { SpectrumFileError } from "./measured-spectrum.ts";

/** One line of a record's value, without its comment; `line` counts from 1 in the file. */
export type ValueLine = Readonly<{ line: number; text: string }>;
export type LabelledRecord = Readonly<{
  /** As the standard compares labels: capitals, without spaces, dashes, slashes and underscores. */
  label: string;
  line: number;
  /** What follows on the label's own line. */
  text: string;
  /** The lines below it, up to the next label. */
  more: readonly ValueLine[];
}>;

/**
 * The labelled data records of a JCAMP-DX text: `##LABEL=value`, the value going on over lines until the next label;
 * `$$` begins a comment that reaches to the end of its line.
 *
 * Source: R. S. McDonald and P. A. Wilks, JCAMP-DX: A Standard Form for Exchange of Infrared Spectra in Computer
 * Readable Form, Applied Spectroscopy 42 (1988) 151–162, section 3 (version 4.24).
 * @throws SpectrumFileError where text stands before the first label or a label has no equals sign
 */
export function labelledRecords(lines: readonly string[]): LabelledRecord[] {
  const records: (Omit<LabelledRecord, "more"> & { more: ValueLine[] })[] = [];
  lines.forEach((whole, at) => {
    const line = at + 1;
    const comment = whole.indexOf("$$");
    const text = (comment < 0 ? whole : whole.slice(0, comment)).trimEnd();
    const start = /^\s*##/.exec(text);
    if (start) {
      const equals = text.indexOf("=");
      if (equals < 0) throw new SpectrumFileError(line, "A label begins with ## and ends with an equals sign; this one has none.");
      records.push({ label: text.slice(start[0].length, equals).toUpperCase().replace(/[\s\-/_]/g, ""), line, text: text.slice(equals + 1).trim(), more: [] });
    } else if (text.trim() !== "") {
      const record = records.at(-1);
      if (!record) throw new SpectrumFileError(line, "Something stands before the first label: a JCAMP-DX file begins with ##TITLE=.");
      record.more.push({ line, text });
    }
  });
  return records;
}
