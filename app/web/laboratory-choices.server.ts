import { currencyCodes } from "#app/domain/money/money.ts";

const currencyNames = new Intl.DisplayNames("en", { type: "currency" });

/** What a laboratory's time zone and currency are chosen from. */
export const laboratoryChoices = {
  timeZones: ["UTC", ...Intl.supportedValuesOf("timeZone").filter((zone) => zone !== "UTC")],
  currencies: currencyCodes.map((code) => ({ value: code, label: `${code}, ${currencyNames.of(code) ?? code}` })),
};
