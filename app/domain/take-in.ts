export const capacities = ["owner", "agent", "executor", "trade", "insurer", "court"] as const;
export type Capacity = (typeof capacities)[number];
export const capacityNames: Readonly<Record<Capacity, string>> = {
  owner: "Owner",
  agent: "Agent of the owner",
  executor: "Executor",
  trade: "Trade",
  insurer: "Insurer",
  court: "Court",
};

export const serviceCodes = ["identification", "secondCheck", "valuation"] as const;
export type ServiceCode = (typeof serviceCodes)[number];
export const serviceNames: Readonly<Record<ServiceCode, string>> = {
  identification: "Identification",
  secondCheck: "Second check",
  valuation: "Valuation",
};

export const mountStates = ["loose", "mounted", "strung"] as const;
export type MountState = (typeof mountStates)[number];

export const returnMethods = ["collect", "courier"] as const;
export type ReturnMethod = (typeof returnMethods)[number];

/** How a stone's code is shown: stored MQ-26-0417-1, read "MQ-26-0417 · 1". */
export function formatStoneCode(code: string): string {
  const at = code.lastIndexOf("-");
  return `${code.slice(0, at)} · ${code.slice(at + 1)}`;
}
