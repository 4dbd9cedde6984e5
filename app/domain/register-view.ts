/** What a stranger sees of an issued report: enough to notice a swapped stone, nothing of the client, no value. */
export type RegisterView = Readonly<{
  laboratoryName: string;
  laboratoryMark: string;
  reportNumber: string;
  reportVersion: number;
  reportOn: string;
  kind: "identification" | "identificationWithValuation";
  title: string;
  statements: readonly string[];
  weight: string;
  dimensions: string;
  cut: string;
  colour: string;
  indices: string;
  density: string;
  signedBy: string;
  hasPhoto: boolean;
}>;
