import { getFormProps, useForm, type SubmissionResult } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { Form, redirect } from "react-router";
import { newPasswordHint, PasswordField } from "#app/components/accounts/password-field.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Chip } from "#app/components/ui/chip.tsx";
import { Confirm } from "#app/components/ui/confirm.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { formatInstant } from "#app/domain/calendar-date.ts";
import { accountForm } from "#app/features/accounts/account-forms.server.ts";
import { changePassword } from "#app/features/accounts/change-password.server.ts";
import { endAllSessions } from "#app/features/accounts/end-all-sessions.server.ts";
import { endOneSession } from "#app/features/accounts/end-one-session.server.ts";
import { listSessions } from "#app/features/accounts/list-sessions.server.ts";
import { renamePerson } from "#app/features/accounts/rename-person.server.ts";
import { appContext, signedInContext } from "#app/web/contexts.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { resultFor } from "#app/web/result-for.ts";
import { endedSessionCookieHeader, sessionCookieHeader } from "#app/web/session-cookie.server.ts";
import type { Route } from "./+types/account";

const hideFields = ["password", "currentPassword"];

export async function loader({ context }: Route.LoaderArgs) {
  const { userId, name, email, sessionToken } = context.get(signedInContext);
  return { name, email, sessions: await listSessions(context.get(appContext), { userId, currentToken: sessionToken }) };
}

export async function action({ request, context }: Route.ActionArgs) {
  const app = context.get(appContext);
  const { userId, sessionToken } = context.get(signedInContext);
  const submission = parseWithZod(await request.formData(), { schema: accountForm });
  if (submission.status !== "success") return formInvalid(submission, { hideFields });
  const input = submission.value;
  const response = redirect(input.intent === "endAll" ? "/sign-in" : "/account");
  const say = async (notice: string) => response.headers.append("Set-Cookie", await noticeHeader(notice));
  try {
    if (input.intent === "rename") {
      await renamePerson(app, { userId, name: input.name });
      await say(`You are called ${input.name} from now on.`);
    } else if (input.intent === "changePassword") {
      const { currentPassword, password } = input;
      const token = await changePassword(app, { userId, currentPassword, password, userAgent: request.headers.get("user-agent") ?? "" });
      response.headers.append("Set-Cookie", await sessionCookieHeader(token));
      await say("The password is changed. Everywhere else you are signed out.");
    } else if (input.intent === "endSession") {
      await endOneSession(app, { userId, sessionId: input.sessionId });
      await say("That place is signed out.");
    } else if (input.intent === "endOthers") {
      await endAllSessions(app, { userId, exceptToken: sessionToken });
      await say("Every other place is signed out.");
    } else {
      await endAllSessions(app, { userId });
      response.headers.append("Set-Cookie", await endedSessionCookieHeader());
      await say("You are signed out everywhere.");
    }
    return response;
  } catch (error) {
    return formRefused(submission, error, { hideFields });
  }
}

export const meta: Route.MetaFunction = () => [{ title: "Your account · Isogyre" }];

export default function AccountRoute({ loaderData, actionData }: Route.ComponentProps) {
  const { name, email, sessions } = loaderData;
  const placesResult = resultFor(actionData?.result, { intent: "endSession" });
  return (
    <div className="mx-auto grid max-w-3xl gap-5">
      <PageHeader title="Your account" note={email} />
      <NameCard name={name} lastResult={resultFor(actionData?.result, { intent: "rename" })} />
      <PasswordCard email={email} lastResult={resultFor(actionData?.result, { intent: "changePassword" })} />
      <Card title="Where you are signed in" note="A place signs out by itself after half a day unused">
        <CardBody>
          <FormAlert errors={placesResult?.error?.[""]} />
          <ul className="grid">
            {sessions.map((session) => (
              <li key={session.id} className="flex flex-wrap items-center gap-x-4 gap-y-1 border-rule py-2.5 not-first:border-t">
                <div className="min-w-0 grow">
                  <p className="font-semibold">
                    {session.place} {session.isCurrent ? <Chip tone="green">This one</Chip> : null}
                  </p>
                  <p className="text-sm text-ink-3">
                    Last used {formatInstant(session.lastSeenAt, "UTC")} UTC, signed in {formatInstant(session.createdAt, "UTC")} UTC
                  </p>
                </div>
                {session.isCurrent ? null : (
                  <Form method="post">
                    <input type="hidden" name="sessionId" value={session.id} />
                    <Button look="quietDanger" size="small" name="intent" value="endSession" aria-label={`Sign out ${session.place}, last used ${formatInstant(session.lastSeenAt, "UTC")}`}>
                      Sign out there
                    </Button>
                  </Form>
                )}
              </li>
            ))}
          </ul>
          <div className="mt-4 flex flex-wrap items-start gap-3">
            {sessions.length > 1 ? (
              <Form method="post">
                <Button look="quiet" name="intent" value="endOthers">
                  Sign out everywhere else
                </Button>
              </Form>
            ) : null}
            <Confirm summary="Sign out everywhere">
              <Form method="post" className="grid gap-3">
                <p>Here too: you will sign in anew.</p>
                <Button look="danger" name="intent" value="endAll" className="justify-self-start">
                  Sign out everywhere
                </Button>
              </Form>
            </Confirm>
          </div>
        </CardBody>
      </Card>
    </div>
  );
}

type LastResult = SubmissionResult<string[]> | undefined;

function NameCard({ name, lastResult }: { name: string; lastResult: LastResult }) {
  const [form, fields] = useForm<{ name: string }>({ id: "rename", lastResult, defaultValue: { name } });
  return (
    <Card title="Name">
      <CardBody>
        <Form method="post" {...getFormProps(form)} className="grid gap-4">
          <FormAlert errors={form.errors} id={form.errorId} />
          <TextField key={fields.name.key} {...fieldProps(fields.name)} label="Your name" hint="As you sign reports from now on; those that are signed keep the old one." autoComplete="name" maxLength={120} />
          <Button look="quiet" name="intent" value="rename" className="justify-self-start">
            Save the name
          </Button>
        </Form>
      </CardBody>
    </Card>
  );
}

function PasswordCard({ email, lastResult }: { email: string; lastResult: LastResult }) {
  const [form, fields] = useForm<{ currentPassword: string; password: string }>({ id: "change-password", lastResult });
  return (
    <Card title="Password" note="Changing it signs out every other place">
      <CardBody>
        <Form method="post" {...getFormProps(form)} className="grid gap-4">
          <FormAlert errors={form.errors} id={form.errorId} />
          <input type="text" name="username" autoComplete="username" value={email} readOnly tabIndex={-1} aria-hidden="true" className="sr-only" />
          <PasswordField id={fields.currentPassword.id} name={fields.currentPassword.name} errors={fields.currentPassword.errors} label="Current password" autoComplete="current-password" />
          <PasswordField id={fields.password.id} name={fields.password.name} errors={fields.password.errors} label="New password" autoComplete="new-password" hint={newPasswordHint} />
          <Button look="quiet" name="intent" value="changePassword" className="justify-self-start">
            Change the password
          </Button>
        </Form>
      </CardBody>
    </Card>
  );
}
