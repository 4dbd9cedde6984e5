import { createRouteHandler, createUploadthing, UploadThingError, type FileRouter } from "uploadthing/server";
import { z } from "zod";
import { AppError } from "#app/domain/app-error.ts";
import type { ItemId, LaboratoryId, UserId } from "#app/domain/ids.ts";
import { roles as allRoles, type Role } from "#app/domain/roles.ts";
import { findLabActor } from "#app/features/laboratories/find-lab-actor.server.ts";
import { addPhoto } from "#app/features/photos/add-photo.server.ts";
import { findItemForPhoto } from "#app/features/photos/find-item-for-photo.server.ts";
import { getRuntime } from "./runtime.server.ts";
import { readSessionToken } from "./session-cookie.server.ts";

const f = createUploadthing();

/**
 * Photographs straight from the browser to UploadThing. Who sends, and whether they may, is settled before the file is
 * taken; afterwards it is fetched, made anew without its metadata, and what was sent is deleted.
 */
export const uploadRouter = {
  photo: f(
    {
      "image/jpeg": { maxFileSize: "16MB", maxFileCount: 8 },
      "image/png": { maxFileSize: "16MB", maxFileCount: 8 },
      "image/webp": { maxFileSize: "16MB", maxFileCount: 8 },
    },
    { awaitServerData: true },
  )
    .input(z.object({ labSlug: z.string().max(60), itemNumber: z.string().max(24) }))
    .middleware(async ({ req, input }) => {
      const { db, services } = getRuntime();
      const now = new Date();
      const token = await readSessionToken(req as unknown as Request);
      const actor = token ? await findLabActor({ db, services, now, clientAddress: "unknown" }, { token, labSlug: input.labSlug }) : undefined;
      if (!actor?.membership) throw new UploadThingError({ code: "FORBIDDEN", message: "Sign in, and send it from the take-in's page." });
      const { laboratoryId, roles } = actor.membership;
      const actorId = actor.signedIn.userId;
      try {
        const itemId = await findItemForPhoto({ db, services, now, laboratoryId, actorId, roles }, input.itemNumber);
        // No session comes with the callback: what was settled here travels with the file, signed by UploadThing.
        return { laboratoryId: laboratoryId as string, actorId: actorId as string, itemId: itemId as string, roles: roles.join(",") };
      } catch (error) {
        if (error instanceof AppError) throw new UploadThingError({ code: error.code === "not_found" ? "NOT_FOUND" : "FORBIDDEN", message: error.userMessage });
        throw error;
      }
    })
    .onUploadComplete(async ({ metadata, file }) => {
      const { db, services } = getRuntime();
      const held = metadata.roles.split(",");
      const scope = {
        db,
        services,
        now: new Date(),
        laboratoryId: metadata.laboratoryId as LaboratoryId,
        actorId: metadata.actorId as UserId,
        roles: allRoles.filter((role): role is Role => held.includes(role)),
      };
      try {
        const bytes = await services.uploads.get(file.key);
        await addPhoto(scope, { itemId: metadata.itemId as ItemId, bytes, fileName: file.name, sourceKey: file.key });
        return { problem: "" };
      } catch (error) {
        if (error instanceof AppError) return { problem: error.userMessage };
        throw error;
      } finally {
        await services.uploads.remove([file.key]);
      }
    }),
} satisfies FileRouter;

export type UploadRouter = typeof uploadRouter;

let handler: ReturnType<typeof createRouteHandler> | undefined;

/** Answers the browser's request for a place to send to, and UploadThing's call when the file is there. */
export function handleUpload(request: Request): Promise<Response> {
  handler ??= createRouteHandler({ router: uploadRouter, config: uploadConfig() });
  return handler(request);
}

function uploadConfig() {
  const { UPLOADTHING_TOKEN, UPLOADTHING_INGEST_URL, UPLOADTHING_CALLBACK_URL, PUBLIC_ORIGIN } = getRuntime().env;
  return {
    token: UPLOADTHING_TOKEN,
    isDev: false,
    callbackUrl: UPLOADTHING_CALLBACK_URL ?? `${PUBLIC_ORIGIN}/api/uploadthing`,
    ...(UPLOADTHING_INGEST_URL && { ingestUrl: UPLOADTHING_INGEST_URL }),
  };
}
