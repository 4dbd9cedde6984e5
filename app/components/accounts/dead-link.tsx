import { Link } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";

/** For a link from a letter that is no good, whatever the reason: which one it is helps only somebody who guesses. */
export function DeadLink({ again }: { again: { to: string; label: string } }) {
  return (
    <>
      <PageHeader title="This link does not work any more" />
      <Card>
        <CardBody className="grid gap-2">
          <p>It was used, it ran out, or a newer one replaced it. Take the link of the newest letter.</p>
          <p>
            <Link to={again.to} className="text-tint">
              {again.label}
            </Link>
          </p>
        </CardBody>
      </Card>
    </>
  );
}
