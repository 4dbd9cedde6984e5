import type { RegisterView } from "#app/domain/register-view.ts";
import type { ReportRow, ReportView } from "#app/reports/report-view.ts";
import { indicesLine } from "./observation-rows.ts";

/**
 * What the register shows of a frozen report. Without the client's consent to a public page it tells only that the
 * document is genuine and how it stands.
 */
export function registerViewOf(view: ReportView, { isPublic, reportOn, hasPhoto }: { isPublic: boolean; reportOn: string; hasPhoto: boolean }): RegisterView {
  const told = <T>(value: T, otherwise: T): T => (isPublic ? value : otherwise);
  const rowOf = (rows: readonly ReportRow[], ...labels: string[]) => rows.find(({ label }) => labels.includes(label))?.parts.map(({ text }) => text).join("  ") ?? "";
  return {
    laboratoryName: view.laboratory.name,
    laboratoryMark: view.laboratory.mark,
    reportNumber: view.number,
    reportVersion: view.version,
    reportOn,
    kind: view.kind,
    title: told(view.conclusion.title, "Details are with the client"),
    statements: told(view.conclusion.statements, ["The client chose not to show the content here. Compare the printed report with the laboratory."]),
    weight: told(rowOf(view.description, "Weight", "Weight as received", "Weight with the setting"), ""),
    dimensions: told(rowOf(view.description, "Dimensions"), ""),
    cut: told(rowOf(view.description, "Shape and cut"), ""),
    colour: told(rowOf(view.description, "Colour"), ""),
    indices: told(indicesLine(view.observations), ""),
    density: told(rowOf(view.observations, "Specific gravity"), ""),
    signedBy: told(view.signatures.map(({ name, statement }) => `${name} (${statement.toLowerCase()})`).join("; "), ""),
    hasPhoto: isPublic && hasPhoto,
  };
}
