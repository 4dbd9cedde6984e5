import { Link } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { LinkButton } from "#app/components/ui/button.tsx";
import { Card } from "#app/components/ui/card.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { isClientSomewhere } from "#app/features/accounts/is-client-somewhere.server.ts";
import { listMyLaboratories } from "#app/features/laboratories/list-my-laboratories.server.ts";
import { appContext, signedInContext } from "#app/web/contexts.server.ts";
import type { Route } from "./+types/laboratories";

export async function loader({ context }: Route.LoaderArgs) {
  const app = context.get(appContext);
  const { userId } = context.get(signedInContext);
  const [laboratories, isClient] = await Promise.all([listMyLaboratories(app, userId), isClientSomewhere(app, userId)]);
  return { laboratories, isClient };
}

export const meta: Route.MetaFunction = () => [{ title: "Your laboratories · Isogyre" }];

export default function LaboratoriesRoute({ loaderData }: Route.ComponentProps) {
  const { laboratories, isClient } = loaderData;
  const places = [...laboratories.map(({ slug, name }) => ({ to: `/lab/${slug}/stones`, name })), ...(isClient ? [{ to: "/my", name: "Your own items and reports" }] : [])];
  return (
    <div className="mx-auto max-w-2xl">
      <PageHeader title="Where to" actions={<LinkButton to="/sign-up">Open a laboratory</LinkButton>} />
      <Card>
        {places.length === 0 ? (
          <EmptyState title="You belong to no laboratory yet">Ask an owner to invite you at your e-mail address, or open a laboratory of your own.</EmptyState>
        ) : (
          <ul>
            {places.map(({ to, name }) => (
              <li key={to} className="border-rule not-first:border-t">
                <Link to={to} className="block px-4.5 py-3.5 font-serif text-lg text-ink no-underline hover:bg-tint-bg hover:underline">
                  {name}
                </Link>
              </li>
            ))}
          </ul>
        )}
      </Card>
    </div>
  );
}
