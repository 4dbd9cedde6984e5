/** A visible spectrum at 0.01 nm has 30,000 points; what is far beyond that is no bench spectrum. */
export const mostSpectrumPoints = 100_000;
/** As text, characters. An uncompressed file of the most points stays well below. */
export const mostSpectrumCharacters = 4_000_000;
export const mostSpectrumLineCharacters = 20_000;
/** What a curve needs at least to have a shape. */
export const fewestSpectrumPoints = 5;
/** Wavelengths that the bench's instruments can mean, nm: from the vacuum ultraviolet to the far infrared. */
export const spectrumRangeNm = { from: 100, to: 100_000 } as const;
