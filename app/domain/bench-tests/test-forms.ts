import { appearance } from "./appearance.ts";
import { brewster } from "./brewster.ts";
import { colourFilter } from "./colour-filter.ts";
import { conductivity } from "./conductivity.ts";
import { dichroscope } from "./dichroscope.ts";
import { heavyLiquid } from "./heavy-liquid.ts";
import { immersion } from "./immersion.ts";
import { magnet } from "./magnet.ts";
import { magnification } from "./magnification.ts";
import { realDepth } from "./real-depth.ts";
import { reflectivity } from "./reflectivity.ts";
import { spectroscope } from "./spectroscope.ts";
import type { DetailOf, NumberNameOf, TestForm } from "./test-form.ts";
import { thermalProbe } from "./thermal-probe.ts";
import { ultraviolet } from "./ultraviolet.ts";

const forms = { appearance, magnification, dichroscope, spectroscope, ultraviolet, colourFilter, thermalProbe, conductivity, magnet, immersion, reflectivity, brewster, realDepth, heavyLiquid } as const;
type Forms = typeof forms;

/** Tests that are described rather than written out: see TestForm. */
export type DescribedKind = keyof Forms;
export const describedKinds = Object.keys(forms) as DescribedKind[];
export const testForms: Readonly<Record<DescribedKind, TestForm>> = forms;
export const isDescribed = (kind: string): kind is DescribedKind => Object.hasOwn(forms, kind);

export type DescribedDetail = { [Kind in DescribedKind]: DetailOf<Forms[Kind]> }[DescribedKind];
export type DescribedNumber = NumberNameOf<Forms[DescribedKind]>;
