/** Wavelengths in air, nm: what indices are printed for, and the lines between which gem dispersion is measured. */
export const sodiumNm = 589.3;
export const fraunhoferBNm = 686.7;
export const fraunhoferGNm = 430.8;
/** Hydrogen's lines, which optics uses instead. */
export const fraunhoferCNm = 656.3;
export const fraunhoferFNm = 486.1;
