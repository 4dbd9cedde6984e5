export const largestSpectrumBytes = 4_000_000;
export const mostSpectraAStone = 12;
/** What the file chooser offers; what counts is in the file. */
export const spectrumFileNames = ".jdx,.dx,.jcm,.jcamp,.csv,.txt,.asc,.tsv,.dat";
