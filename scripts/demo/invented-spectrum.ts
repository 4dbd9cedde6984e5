export type InventedBand = readonly [nm: number, widthNm: number, absorbance: number];

/** The spectrum of a stone that does not exist, as a spectrometer's JCAMP-DX file: bands on a rise towards the violet, with a little noise. */
export function inventedSpectrum({ title, bands }: { title: string; bands: readonly InventedBand[] }): Buffer {
  const nms = Array.from({ length: 801 }, (_, at) => 380 + at * 0.5);
  let state = 20261;
  const noise = () => ((state = (state * 1103515245 + 12345) % 2 ** 31) / 2 ** 31 - 0.5) * 0.004;
  const ordinates = nms.map((nm) => {
    const absorbance = 0.12 + 0.9 * Math.exp((380 - nm) / 60) + bands.reduce((sum, [at, widthNm, height]) => sum + height * Math.exp(-4 * Math.LN2 * ((nm - at) / widthNm) ** 2), 0);
    return Math.round((absorbance + noise()) * 10_000);
  });
  const lines: string[] = [];
  for (let at = 0; at < ordinates.length; at += 10) lines.push([nms[at]!.toFixed(1), ...ordinates.slice(at, at + 10)].join(" "));
  const records = [`##TITLE=${title}`, "##JCAMP-DX=4.24", "##DATA TYPE=UV/VIS SPECTRUM", "##ORIGIN=Invented for the demonstration", "##OWNER=Marram Quay Gem Testing", "##XUNITS=NANOMETERS", "##YUNITS=ABSORBANCE", "##FIRSTX=380", "##LASTX=780", `##NPOINTS=${ordinates.length}`, "##XFACTOR=1", "##YFACTOR=0.0001", `##FIRSTY=${(ordinates[0]! / 10_000).toFixed(4)}`, "##XYDATA=(X++(Y..Y))"];
  return Buffer.from([...records, ...lines, "##END=", ""].join("\r\n"));
}
