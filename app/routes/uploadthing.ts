import { handleUpload } from "#app/web/upload-router.server.ts";
import type { Route } from "./+types/uploadthing";

export const loader = ({ request }: Route.LoaderArgs) => handleUpload(request);
export const action = ({ request }: Route.ActionArgs) => handleUpload(request);
