import { getFormProps, useForm, type SubmissionResult } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { Form, redirect } from "react-router";
import { SettingsNav } from "#app/components/accounts/settings-nav.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { CheckboxGroupField } from "#app/components/ui/choice-field.tsx";
import { Chip } from "#app/components/ui/chip.tsx";
import { Confirm } from "#app/components/ui/confirm.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { formatInstant } from "#app/domain/calendar-date.ts";
import type { UserId } from "#app/domain/ids.ts";
import { roleNames, roles, type Role } from "#app/domain/roles.ts";
import { inviteStaff } from "#app/features/accounts/invite-staff.server.ts";
import { withdrawInvitation } from "#app/features/accounts/withdraw-invitation.server.ts";
import { endMembership } from "#app/features/laboratories/end-membership.server.ts";
import { teamForm } from "#app/features/laboratories/laboratory-forms.server.ts";
import { listTeam } from "#app/features/laboratories/list-team.server.ts";
import { setMemberRoles } from "#app/features/laboratories/set-member-roles.server.ts";
import { newRequestId } from "#app/features/new-request-id.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import { resultFor } from "#app/web/result-for.ts";
import type { Route } from "./+types/team";

export async function loader({ context }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  return { ...(await orResponse(listTeam(ctx))), timeZone: ctx.laboratory.timeZone, actorId: ctx.actorId, requestId: newRequestId() };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "team.manage");
  const submission = parseWithZod(await request.formData(), { schema: teamForm });
  if (submission.status !== "success") return formInvalid(submission);
  const input = submission.value;
  try {
    let notice: string;
    if (input.intent === "invite") {
      await inviteStaff(ctx, input);
      notice = `An invitation is on its way to ${input.email}.`;
    } else if (input.intent === "setRoles") {
      await setMemberRoles(ctx, { ...input, userId: input.userId as UserId });
      notice = "The roles are set.";
    } else if (input.intent === "end") {
      await endMembership(ctx, { userId: input.userId as UserId });
      notice = "The membership is ended. What the person recorded and signed stays.";
    } else {
      await withdrawInvitation(ctx, input);
      notice = "The invitation is withdrawn; its link does not work any more.";
    }
    return redirect(`/lab/${params.labSlug}/settings/team`, { headers: { "Set-Cookie": await noticeHeader(notice) } });
  } catch (error) {
    return formRefused(submission, error);
  }
}

export const meta: Route.MetaFunction = () => [{ title: "Team · Isogyre" }];

const roleHints: Readonly<Record<Role, string>> = {
  owner: "Runs the laboratory: team, fees, letterhead, instruments, withdrawing a report.",
  gemmologist: "Takes readings, concludes, checks others, signs identification reports.",
  appraiser: "Writes and signs valuations.",
  desk: "Takes in, bills and hands back; never a conclusion or a value.",
};
const roleOptions = roles.map((role) => ({ value: role, label: roleNames[role], hint: roleHints[role] }));

type Member = Route.ComponentProps["loaderData"]["members"][number];
type LastResult = SubmissionResult<string[]> | undefined;

export default function TeamRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { members, invitations, timeZone, actorId, requestId } = loaderData;
  const result = actionData?.result;
  const withdrawal = resultFor(result, { intent: "withdraw" });
  return (
    <>
      <PageHeader title="Laboratory" />
      <SettingsNav labSlug={params.labSlug} />
      <div className="grid gap-5 lg:grid-cols-[minmax(0,1fr)_24rem]">
        <div className="grid content-start gap-5">
          <Card title="Team" note={members.length === 1 ? "One person" : `${members.length} people`}>
            <ul>
              {members.map((member) => (
                <MemberRow
                  key={`${member.userId} ${member.roles.join()} ${member.title}`}
                  member={member}
                  isSelf={member.userId === actorId}
                  since={formatInstant(member.joinedAt, timeZone)}
                  rolesResult={resultFor(result, { intent: "setRoles", userId: member.userId })}
                  endResult={resultFor(result, { intent: "end", userId: member.userId })}
                />
              ))}
            </ul>
          </Card>
          {invitations.length > 0 ? (
            <Card title="Invited" note="Not yet accepted">
              <CardBody>
                <FormAlert errors={withdrawal?.error?.[""]} />
                <ul>
                  {invitations.map((invitation) => (
                    <li key={invitation.id} className="flex flex-wrap items-center gap-x-4 gap-y-1 border-rule py-2.5 not-first:border-t">
                      <div className="min-w-0 grow">
                        <p className="font-semibold break-words">
                          {invitation.name}, {invitation.email}
                        </p>
                        <p className="text-sm text-ink-3">
                          {invitation.roles.map((role) => roleNames[role]).join(", ")}; the link works until {formatInstant(invitation.expiresAt, timeZone)}
                        </p>
                      </div>
                      <Form method="post">
                        <input type="hidden" name="invitationId" value={invitation.id} />
                        <Button look="quietDanger" size="small" name="intent" value="withdraw" aria-label={`Withdraw the invitation of ${invitation.email}`}>
                          Withdraw
                        </Button>
                      </Form>
                    </li>
                  ))}
                </ul>
              </CardBody>
            </Card>
          ) : null}
        </div>
        <InviteCard key={requestId} requestId={requestId} lastResult={resultFor(result, { intent: "invite" })} />
      </div>
    </>
  );
}

function MemberRow({ member, isSelf, since, rolesResult, endResult }: { member: Member; isSelf: boolean; since: string; rolesResult: LastResult; endResult: LastResult }) {
  const [form, fields] = useForm<{ title: string; roles: string[] }>({ id: `roles-${member.userId}`, lastResult: rolesResult, defaultValue: { title: member.title, roles: member.roles } });
  const typedRoles = fields.roles.initialValue;
  return (
    <li className="border-t border-rule px-4.5 py-3">
      <div className="flex flex-wrap items-baseline gap-x-3 gap-y-1">
        <p className="font-semibold">{member.name}</p>
        {isSelf ? <span className="text-sm text-ink-3">you</span> : null}
        <span className="flex flex-wrap gap-1.5">
          {member.roles.map((role) => (
            <Chip key={role} tone={role === "owner" ? "tint" : "plain"}>
              {roleNames[role]}
            </Chip>
          ))}
        </span>
      </div>
      <p className="text-sm break-words text-ink-3">
        {[member.title, member.email, `since ${since}`].filter(Boolean).join(" · ")}
      </p>
      <details className="mt-1" open={Boolean(rolesResult ?? endResult)}>
        <summary className="inline-flex min-h-6 items-center text-sm text-tint underline">Change {member.name}</summary>
        <div className="mt-2 grid gap-4 pb-1">
          <Form method="post" {...getFormProps(form)} className="grid gap-4">
            <FormAlert errors={form.errors} id={form.errorId} />
            <input type="hidden" name="userId" value={member.userId} />
            <input type="hidden" name="rolesBefore" value={member.roles.join()} />
            <input type="hidden" name="titleBefore" value={member.title} />
            <CheckboxGroupField
              id={fields.roles.id}
              name={fields.roles.name}
              errors={fields.roles.errors}
              label="Roles"
              options={roleOptions}
              defaultValues={Array.isArray(typedRoles) ? (typedRoles as string[]) : typedRoles ? [String(typedRoles)] : []}
            />
            <TextField key={fields.title.key} {...fieldProps(fields.title)} label="Title below a signature" hint="In the person’s own words." isRequired={false} maxLength={120} />
            <Button look="quiet" name="intent" value="setRoles" className="justify-self-start">
              Set the roles
            </Button>
          </Form>
          <FormAlert errors={endResult?.error?.[""]} />
          <Confirm summary="End the membership">
            <Form method="post" className="grid gap-3">
              <input type="hidden" name="userId" value={member.userId} />
              <p>{isSelf ? "You" : member.name} can no longer open this laboratory. What was recorded and signed stays.</p>
              <Button look="danger" name="intent" value="end" className="justify-self-start">
                End the membership
              </Button>
            </Form>
          </Confirm>
        </div>
      </details>
    </li>
  );
}

function InviteCard({ requestId, lastResult }: { requestId: string; lastResult: LastResult }) {
  const [form, fields] = useForm<{ requestId: string; name: string; email: string; title: string; roles: string[] }>({ id: "invite", lastResult, defaultValue: { requestId } });
  const typedRoles = fields.roles.initialValue;
  return (
    <Card title="Invite somebody" className="self-start">
      <CardBody>
        <Form method="post" {...getFormProps(form)} className="grid gap-4">
          <FormAlert errors={form.errors} id={form.errorId} />
          <input type="hidden" name={fields.requestId.name} defaultValue={fields.requestId.initialValue} key={fields.requestId.key} />
          <TextField key={fields.name.key} {...fieldProps(fields.name)} label="Name" autoComplete="off" maxLength={120} />
          <TextField key={fields.email.key} {...fieldProps(fields.email)} label="E-mail address" type="email" autoComplete="off" autoCapitalize="none" maxLength={254} />
          <TextField key={fields.title.key} {...fieldProps(fields.title)} label="Title below a signature" isRequired={false} maxLength={120} />
          <CheckboxGroupField
            id={fields.roles.id}
            name={fields.roles.name}
            errors={fields.roles.errors}
            label="Roles"
            options={roleOptions}
            defaultValues={Array.isArray(typedRoles) ? (typedRoles as string[]) : typedRoles ? [String(typedRoles)] : []}
          />
          <Button name="intent" value="invite" className="justify-self-start">
            Send the invitation
          </Button>
          <p className="text-sm text-ink-3">Clients are invited from their own page.</p>
        </Form>
      </CardBody>
    </Card>
  );
}
