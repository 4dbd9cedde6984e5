export { instrumentKindNames, instrumentKinds } from "#app/domain/instrument-kind.ts";

export const instrumentStatusNames = { inService: "In service", restricted: "Restricted", outOfService: "Out of service" } as const;
