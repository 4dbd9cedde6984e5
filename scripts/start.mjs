// `npm start`
import { runProduct } from "./run-product.mjs";

await runProduct({ server: { args: ["server/server.mjs"], stopWithinMs: 12_000 } });
