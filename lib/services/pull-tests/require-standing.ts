import { groundRow } from "@/lib/calc/ground";
import type { AnchorSpec } from "@/lib/calc/types";
import type { TestedGround } from "@/lib/domain/pull-test/schema";
import { AppError } from "@/lib/errors";

/** A stake has to be in the ground, and the ground one that it goes into; what else fits is for the model to say. */
export function requireStanding(
  anchor: AnchorSpec,
  ground: TestedGround,
  reading: { readonly depthOutM: number },
): void {
  const row = groundRow(ground.kind);
  if (row.model.kind === "undriveable") {
    const message = `${row.name}: ${row.model.reason} Pulls there teach nothing of the ground.`;
    throw new AppError("bad-input", message, { fieldErrors: { anchorId: [message] } });
  }
  if (anchor.class === "stake" && reading.depthOutM >= anchor.lengthM) {
    const message = "That leaves no stake in the ground: less has to stand out than the stake is long.";
    throw new AppError("bad-input", message, { fieldErrors: { "reading.depthOutM": [message] } });
  }
}
