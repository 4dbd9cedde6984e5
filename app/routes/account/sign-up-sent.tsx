import { Link } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import type { Route } from "./+types/sign-up-sent";

export const meta: Route.MetaFunction = () => [{ title: "Look into your mailbox · Isogyre" }];

export default function SignUpSentRoute() {
  return (
    <>
      <PageHeader title="Look into your mailbox" />
      <Card>
        <CardBody className="grid gap-2">
          <p>A letter is on its way. Follow its link within 24 hours, and your laboratory is open.</p>
          <p className="text-ink-2">
            No letter after some minutes? Look among unwanted mail, or{" "}
            <Link to="/sign-up" className="text-tint">
              fill in the form again
            </Link>
            : perhaps the address was mistyped.
          </p>
        </CardBody>
      </Card>
    </>
  );
}
