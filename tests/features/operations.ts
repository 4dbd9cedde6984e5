import { newId } from "#app/db/new-id.server.ts";
import type { Operation } from "#app/domain/permissions.ts";
import { inviteClient } from "#app/features/accounts/invite-client.server.ts";
import { inviteStaff } from "#app/features/accounts/invite-staff.server.ts";
import { withdrawInvitation } from "#app/features/accounts/withdraw-invitation.server.ts";
import { endMembership } from "#app/features/laboratories/end-membership.server.ts";
import { getLaboratorySettings } from "#app/features/laboratories/get-laboratory-settings.server.ts";
import { listPrices } from "#app/features/laboratories/list-prices.server.ts";
import { listTeam } from "#app/features/laboratories/list-team.server.ts";
import { priceListMark } from "#app/features/laboratories/price-list-mark.ts";
import { setMemberRoles } from "#app/features/laboratories/set-member-roles.server.ts";
import { updateLaboratory } from "#app/features/laboratories/update-laboratory.server.ts";
import { updatePrices } from "#app/features/laboratories/update-prices.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { aRequestId } from "../setup/an-app.ts";
import { aClient, aMember } from "../setup/factories.ts";

/** One feature operation, so that permission-matrix.test.ts can run it as every role and against another laboratory's rows. */
export type OperationEntry<Ids> = {
  /** Of the function, which names its file. */
  name: string;
  operation: Operation;
  /** Makes what the call needs, as an owner with every role. */
  rows: (lab: LabContext) => Promise<Ids>;
  call: (ctx: LabContext, ids: Ids) => Promise<unknown>;
  /** It names no row, so another laboratory's cannot be asked for. */
  hasNoIds?: true;
  /** With the role, it may still be refused for the state the rows are in. */
  mayBeRefused?: true;
};

/** Keeps the type of `rows` and `call` together and forgets it in the list. */
function entry<Ids>(described: OperationEntry<Ids>): OperationEntry<unknown> {
  return described as OperationEntry<unknown>;
}

const nothing = async () => undefined;
const settings = { name: "Renamed", addressLines: ["1 Row"], phone: "", email: "", timeZone: "UTC", isSolePractice: false, taxLabel: "VAT", taxShareE4: 0, usualDays: 5, selfCheckDelayHours: 24, custodyLimitMinor: null, version: 1 };
const anInvitation = () => ({ name: "Odo", email: `${aRequestId()}@example.test`, title: "", roles: ["desk"] as const, requestId: aRequestId() });

/** One entry an operation. */
export const operationEntries: ReadonlyArray<OperationEntry<unknown>> = [
  // laboratories
  entry({ name: "getLaboratorySettings", operation: "laboratory.manage", rows: nothing, call: (ctx) => getLaboratorySettings(ctx), hasNoIds: true }),
  entry({ name: "updateLaboratory", operation: "laboratory.manage", rows: nothing, call: (ctx) => updateLaboratory(ctx, settings), hasNoIds: true }),
  entry({ name: "listTeam", operation: "team.manage", rows: nothing, call: (ctx) => listTeam(ctx), hasNoIds: true }),
  entry({
    name: "setMemberRoles",
    operation: "team.manage",
    rows: async (lab) => (await aMember(lab, ["desk"])).actorId,
    call: (ctx, userId) => setMemberRoles(ctx, { userId, roles: ["appraiser"], title: "Valuer", rolesBefore: ["desk"], titleBefore: "Gemmologist" }),
  }),
  entry({ name: "endMembership", operation: "team.manage", rows: async (lab) => (await aMember(lab, ["desk"])).actorId, call: (ctx, userId) => endMembership(ctx, { userId }) }),
  entry({ name: "listPrices", operation: "prices.read", rows: nothing, call: (ctx) => listPrices(ctx), hasNoIds: true }),
  entry({
    name: "updatePrices",
    operation: "prices.manage",
    rows: async (lab) => listPrices(lab),
    call: (ctx, list) => updatePrices(ctx, { before: priceListMark(list), changes: list.map((price) => ({ ...price, amountMinor: 100 })) }),
    hasNoIds: true,
  }),

  // accounts
  entry({ name: "inviteStaff", operation: "team.manage", rows: nothing, call: (ctx) => inviteStaff(ctx, anInvitation()), hasNoIds: true }),
  entry({
    name: "withdrawInvitation",
    operation: "team.manage",
    rows: async (lab) => {
      await inviteStaff(lab, anInvitation());
      return (await listTeam(lab)).invitations[0]!.id;
    },
    call: (ctx, invitationId) => withdrawInvitation(ctx, { invitationId }),
  }),
  entry({ name: "inviteClient", operation: "clients.manage", rows: (lab) => aClient(lab), call: (ctx, clientId) => inviteClient(ctx, { clientId, requestId: newId() }) }),
];
