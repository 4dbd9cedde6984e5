import { LinkButton } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";

/** Before a gemmologist sees what the first one found, they are asked whether they will be the one who checks it. */
export function CheckOffer({ base }: { base: string }) {
  return (
    <Card title="This stone waits for its second check">
      <CardBody>
        <p className="max-w-prose text-ink-2">
          A second check is made without having seen the first examination. Its readings, candidates and conclusion are kept from you here, so that you can be the one who makes it.
        </p>
        <div className="mt-4 flex flex-wrap gap-2.5">
          <LinkButton to={`${base}/second-check`} look="primary">
            Go to the second check
          </LinkButton>
          <LinkButton to="?show=examination">Show the examination, and leave the check to somebody else</LinkButton>
        </div>
      </CardBody>
    </Card>
  );
}
