import { redirect } from "react-router";
import type { Route } from "./+types/home";

export function loader({ params }: Route.LoaderArgs) {
  return redirect(`/lab/${params.labSlug}/stones`);
}
