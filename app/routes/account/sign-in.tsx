import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { Form, Link, redirect } from "react-router";
import { PasswordField } from "#app/components/accounts/password-field.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { signInForm } from "#app/features/accounts/account-forms.server.ts";
import { landingPath } from "#app/features/accounts/landing-path.server.ts";
import { listDemonstrationPeople } from "#app/features/accounts/list-demonstration-people.server.ts";
import { authenticate } from "#app/web/authenticator.server.ts";
import { appContext } from "#app/web/contexts.server.ts";
import { demonstrationPassword } from "#app/web/demonstration.server.ts";
import { findAsker } from "#app/web/find-asker.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { safeReturnPath } from "#app/web/safe-return-path.ts";
import { signedInRedirect } from "#app/web/signed-in-redirect.server.ts";
import type { Route } from "./+types/sign-in";

export async function loader({ request, context, url }: Route.LoaderArgs) {
  const app = context.get(appContext);
  const asker = await findAsker(app, request);
  if (asker) throw redirect(safeReturnPath(url.searchParams.get("next"), await landingPath(app, asker.userId)));
  const password = demonstrationPassword();
  return { demonstration: password ? { password, people: await listDemonstrationPeople(app) } : null };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const app = context.get(appContext);
  const submission = parseWithZod(await request.clone().formData(), { schema: signInForm });
  if (submission.status !== "success") return formInvalid(submission, { hideFields: ["password"] });
  try {
    const userId = await authenticate(app, request);
    return await signedInRedirect(app, request, { userId, to: safeReturnPath(url.searchParams.get("next"), await landingPath(app, userId)) });
  } catch (error) {
    return formRefused(submission, error, { hideFields: ["password"] });
  }
}

export const meta: Route.MetaFunction = () => [{ title: "Sign in · Isogyre" }];

export default function SignInRoute({ loaderData, actionData }: Route.ComponentProps) {
  const [form, fields] = useForm<{ email: string; password: string }>({ id: "sign-in", lastResult: actionData?.result });
  const { demonstration } = loaderData;
  return (
    <>
      <PageHeader title="Sign in" note="To your laboratory, or to your own items and reports as a client." />
      <Card>
        <CardBody>
          <Form method="post" {...getFormProps(form)} className="grid gap-4">
            <FormAlert errors={form.errors} id={form.errorId} />
            <TextField key={fields.email.key} {...fieldProps(fields.email)} label="E-mail address" type="email" autoComplete="username" autoCapitalize="none" spellCheck={false} maxLength={254} />
            <PasswordField id={fields.password.id} name={fields.password.name} errors={fields.password.errors} label="Password" autoComplete="current-password" />
            <div className="flex flex-wrap items-center gap-x-5 gap-y-2">
              <Button>Sign in</Button>
              <Link to="/forgot-password" className="text-tint">
                Forgot the password
              </Link>
              <Link to="/sign-up" className="text-tint">
                Open a laboratory
              </Link>
            </div>
          </Form>
        </CardBody>
      </Card>
      {demonstration && demonstration.people.length > 0 ? <DemonstrationPeople {...demonstration} /> : null}
    </>
  );
}

type Demonstration = NonNullable<Route.ComponentProps["loaderData"]["demonstration"]>;

function DemonstrationPeople({ password, people }: Demonstration) {
  const places = [...new Set(people.map((person) => person.laboratoryName))];
  return (
    <Card title="Demonstration" note="Invented people; one press signs in" className="mt-5">
      <CardBody className="grid gap-4">
        {places.map((place) => (
          <section key={place ?? ""}>
            <h3 className="mb-1.5">{place ?? "Clients"}</h3>
            <ul className="grid gap-2 sm:grid-cols-2">
              {people
                .filter((person) => person.laboratoryName === place)
                .map((person) => (
                  <li key={person.email} className="min-w-0">
                    <Form method="post">
                      <input type="hidden" name="email" value={person.email} />
                      <input type="hidden" name="password" value={password} />
                      <button className="w-full cursor-pointer rounded-md border border-rule-2 bg-sheet px-3.5 py-2 text-left hover:border-edge hover:bg-tint-bg">
                        <span className="block font-semibold text-tint">{person.name}</span>
                        <span className="block text-sm text-ink-2">{person.work}</span>
                      </button>
                    </Form>
                  </li>
                ))}
            </ul>
          </section>
        ))}
        <p className="text-sm text-ink-3">
          Password of all of them: <span className="font-mono">{password}</span>
        </p>
      </CardBody>
    </Card>
  );
}
