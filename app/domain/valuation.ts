/** Value types an opinion may state; each needs its written definition and source (workflow 1.10, wording.md §8). */
export const valueTypeNames = {
  retailReplacementNew: "Retail replacement value, new",
  replacementSecondHand: "Replacement value, second-hand or antique",
  fairMarketValue: "Fair market value (US tax)",
  openMarketValue: "Open-market value (UK probate)",
  marketValue: "Market value",
  marketableCash: "Marketable cash value, net of costs",
  orderlyLiquidation: "Orderly liquidation value",
  forcedLiquidation: "Forced liquidation value",
} as const;
export type ValueType = keyof typeof valueTypeNames;
export const valueTypes = Object.keys(valueTypeNames) as ValueType[];

export const marketLevelNames = {
  retailIndependent: "Independent retail",
  retailChain: "Retail chain",
  retailOnline: "Online retail",
  antiqueSpecialist: "Antique specialist",
  auction: "Auction",
  dealerToDealer: "Dealer to dealer",
  privateSale: "Private sale",
} as const;
export type MarketLevel = keyof typeof marketLevelNames;
export const marketLevels = Object.keys(marketLevelNames) as MarketLevel[];

export const comparableKindNames = {
  auctionResult: "Auction result",
  dealerAsking: "Dealer asking",
  retailAsk: "Retail asking",
  privateSale: "Private sale",
  quotation: "Quotation",
} as const;
export type ComparableKind = keyof typeof comparableKindNames;
export const comparableKinds = Object.keys(comparableKindNames) as ComparableKind[];

/** Points that the appraiser certifies one by one before signing: content after USPAP Standards Rule 8-3, words ours. */
export const certificationPointTexts = {
  factsTrue: "The statements of fact in this report are true and correct to the best of my knowledge.",
  opinionsOwn: "The analyses, opinions and conclusions are my own, impartial and limited only by the conditions stated.",
  noInterest: "I have no present or intended interest in the property and none in the parties, other than what is stated here.",
  noBias: "I am not biased towards the property or the parties.",
  priorServicesStated: "My services on this property within the three years before this assignment are stated, or there were none.",
  notPredetermined: "My engagement did not depend on reporting a result set beforehand.",
  payIndependent: "My pay does not depend on the value, its direction, the result or a later event.",
  inspectionStated: "Whether I inspected the property in person is stated.",
  helpStated: "Everybody who gave significant help is named, or there was none.",
} as const;
export type CertificationPoint = keyof typeof certificationPointTexts;
export const certificationPoints = Object.keys(certificationPointTexts) as CertificationPoint[];
