import { and, eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { clientUsers, membershipRoles, memberships } from "#app/db/schema/index.ts";
import { acceptInvitation } from "#app/features/accounts/accept-invitation.server.ts";
import { findInvitation } from "#app/features/accounts/find-invitation.server.ts";
import { inviteClient } from "#app/features/accounts/invite-client.server.ts";
import { inviteStaff } from "#app/features/accounts/invite-staff.server.ts";
import { landingPath } from "#app/features/accounts/landing-path.server.ts";
import { withdrawInvitation } from "#app/features/accounts/withdraw-invitation.server.ts";
import { endMembership } from "#app/features/laboratories/end-membership.server.ts";
import { listTeam } from "#app/features/laboratories/list-team.server.ts";
import { aClient, aLab, aMember, later } from "../../setup/factories.ts";
import { anApp, aPerson, aRequestId, goodPassword, lettersTo } from "../../setup/an-app.ts";

const anInvitation = () => ({ name: "Odo Fenwright", email: `${aRequestId().slice(0, 13)}@example.test`, title: "Gemmologist", roles: ["gemmologist", "desk"] as const, requestId: aRequestId() });

test("an invited person without account chooses a password and joins with the roles of the invitation", async () => {
  const [app, lab] = [await anApp(), await aLab()];
  const invitation = anInvitation();
  await inviteStaff(lab, { ...invitation, email: invitation.email.toUpperCase() });
  expect((await listTeam(lab)).invitations).toMatchObject([{ email: invitation.email, roles: ["gemmologist", "desk"] }]);
  const [letter] = await lettersTo(app, invitation.email);
  expect(await findInvitation(app, letter!.token)).toMatchObject({ kind: "staff", laboratoryName: lab.laboratory.name, roleNames: ["Gemmologist", "Desk"], hasAccount: false });
  await expect(acceptInvitation(app, { token: letter!.token, by: { name: "Odo", password: "short" } })).rejects.toMatchObject({ fieldErrors: { password: [expect.any(String)] } });
  const { userId, goTo } = await acceptInvitation(app, { token: letter!.token, by: { name: "Odo Fenwright", password: goodPassword } });
  expect(goTo).toBe(`/lab/${lab.laboratory.slug}/stones`);
  const team = await listTeam(lab);
  expect(team.members.find((member) => member.userId === userId)).toMatchObject({ name: "Odo Fenwright", title: "Gemmologist", roles: ["gemmologist", "desk"] });
  expect(team.invitations).toEqual([]);
  await expect(acceptInvitation(app, { token: letter!.token, by: { name: "Odo", password: goodPassword } })).rejects.toMatchObject({ code: "not_found" });
});

test("a person with an account accepts only while signed in as that account", async () => {
  const [app, lab] = [await anApp(), await aLab()];
  const [person, stranger] = [await aPerson(app), await aPerson(app)];
  await inviteStaff(lab, { ...anInvitation(), email: person.email });
  const { token } = (await lettersTo(app, person.email))[0]!;
  await expect(acceptInvitation(app, { token, by: { name: "X", password: goodPassword } })).rejects.toMatchObject({ code: "conflict" });
  await expect(acceptInvitation(app, { token, by: { signedInAs: stranger.userId } })).rejects.toMatchObject({ code: "conflict" });
  const tries = await Promise.allSettled(Array.from({ length: 4 }, () => acceptInvitation(app, { token, by: { signedInAs: person.userId } })));
  expect(tries.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
  expect(await landingPath(app, person.userId)).toBe(`/lab/${lab.laboratory.slug}/stones`);
  expect(await landingPath(app, stranger.userId)).toBe("/laboratories");
});

test("sent twice is sent once; a newer invitation replaces an older one; a withdrawn one leads nowhere", async () => {
  const [app, lab] = [await anApp(), await aLab()];
  const invitation = anInvitation();
  await Promise.all([inviteStaff(lab, invitation), inviteStaff(lab, invitation)]);
  expect(await lettersTo(app, invitation.email)).toHaveLength(1);
  await inviteStaff(lab, { ...invitation, requestId: aRequestId(), roles: ["desk"] });
  const [newer, older] = await lettersTo(app, invitation.email);
  expect(await findInvitation(app, older!.token)).toBeUndefined();
  const [waiting] = (await listTeam(lab)).invitations;
  expect(waiting).toMatchObject({ roles: ["desk"] });
  await withdrawInvitation(lab, { invitationId: waiting!.id });
  expect(await findInvitation(app, newer!.token)).toBeUndefined();
  await expect(withdrawInvitation(lab, { invitationId: waiting!.id })).rejects.toMatchObject({ code: "not_found" });
});

test("an invitation runs out after a fortnight", async () => {
  const [app, lab] = [await anApp(), await aLab()];
  const invitation = anInvitation();
  await inviteStaff(lab, invitation);
  const { token } = (await lettersTo(app, invitation.email))[0]!;
  expect(await findInvitation(later(app, 14 * 24 * 3_600_000), token)).toBeUndefined();
});

test("a member is not invited again; somebody who left may come back, with the new roles only", async () => {
  const [app, lab] = [await anApp(), await aLab()];
  const member = await aMember(lab, ["gemmologist"]);
  await expect(inviteStaff(lab, { ...anInvitation(), email: member.person.email })).rejects.toMatchObject({ code: "conflict" });
  await endMembership(lab, { userId: member.actorId });
  await inviteStaff(lab, { ...anInvitation(), email: member.person.email, roles: ["desk"] });
  const { token } = (await lettersTo(app, member.person.email))[0]!;
  await acceptInvitation(app, { token, by: { signedInAs: member.actorId } });
  const held = await app.db.select({ role: membershipRoles.role }).from(membershipRoles).where(and(eq(membershipRoles.laboratoryId, lab.laboratoryId), eq(membershipRoles.userId, member.actorId)));
  expect(held).toEqual([{ role: "desk" }]);
  const [row] = await app.db.select({ endedAt: memberships.endedAt }).from(memberships).where(and(eq(memberships.laboratoryId, lab.laboratoryId), eq(memberships.userId, member.actorId)));
  expect(row).toEqual({ endedAt: null });
});

test("an invited client sees their own pages, and joins nothing else", async () => {
  const [app, lab] = [await anApp(), await aLab()];
  const email = `${aRequestId().slice(0, 13)}@example.test`;
  const clientId = await aClient(lab, { email });
  const requestId = aRequestId();
  expect(await inviteClient(lab, { clientId, requestId })).toEqual({ to: email });
  await inviteClient(lab, { clientId, requestId });
  const letters = await lettersTo(app, email);
  expect(letters).toHaveLength(1);
  const { userId, goTo } = await acceptInvitation(app, { token: letters[0]!.token, by: { name: "L. Ardenne", password: goodPassword } });
  expect([goTo, await landingPath(app, userId)]).toEqual(["/my", "/my"]);
  expect(await app.db.select({ clientId: clientUsers.clientId }).from(clientUsers).where(eq(clientUsers.userId, userId))).toEqual([{ clientId }]);
  expect(await app.db.select().from(memberships).where(eq(memberships.userId, userId))).toEqual([]);
});

test("a client without e-mail address cannot be invited", async () => {
  const lab = await aLab();
  const clientId = await aClient(lab, { email: "" });
  await expect(inviteClient(lab, { clientId, requestId: aRequestId() })).rejects.toMatchObject({ code: "conflict" });
});
