import type { Crew } from "./crew.mjs";

export declare function buildIfChanged(crew: Crew): Promise<boolean>;
