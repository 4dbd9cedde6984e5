import { expect, test } from "vitest";
import { redactPath } from "../../server/redact-path.mjs";

test.each([
  ["/v/7K2M-9QX4-B1TD-0HJW?from=qr", "/v/…"],
  ["/v/7K2M9QX4B1TD0HJW/photo", "/v/…/photo"],
  ["/join/Yk3dQ0m1x9rS7tVbNcAzLpWqEuIo2h4G5j6K8fDsXyZ", "/join/…"],
  ["/pay/abc?returned=paid", "/pay/…"],
  ["/elsewhere/Yk3dQ0m1x9rS7tVbNcAzLp.data", "/elsewhere/…"],
  ["/lab/marram-quay-gem-testing/stones/MQ-26-0417", "/lab/marram-quay-gem-testing/stones/MQ-26-0417"],
  ["/lab/mq/photos/01938f5e-7c5a-7d3e-9b1a-0f2e4d6c8a90", "/lab/mq/photos/01938f5e-7c5a-7d3e-9b1a-0f2e4d6c8a90"],
  ["/sign-in?next=%2Flab", "/sign-in"],
  ["/", "/"],
])("%s is logged as %s", (asked, logged) => {
  expect(redactPath(asked)).toBe(logged);
});
