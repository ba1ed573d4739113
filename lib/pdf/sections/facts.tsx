import { GREY, HAIR, TYPE } from "../theme";
import { columns, fittingSize, rule, spacer, stack, textBlock, type Block } from "./block";

export interface Fact {
  readonly label: string;
  readonly value: string;
  readonly remark: string;
}

/** Two to four things to know first, large. */
export function factRow(facts: readonly Fact[], width: number): Block {
  const gap = 16;
  const each = (width - gap * (facts.length - 1)) / facts.length;
  // One size for the row: facts of different sizes would look like facts of different weight.
  const size = Math.min(...facts.map((fact) => fittingSize(fact.value, each, [TYPE.fact, 19, 16, TYPE.number], 800)));
  return stack([
    spacer(7),
    columns(
      facts.map((fact) => ({
        width: each,
        block: stack([
          textBlock(fact.label, each, { size: TYPE.small, color: GREY }),
          textBlock(fact.value, each, { size, weight: 800 }),
          textBlock(fact.remark, each, { size: TYPE.small }),
        ]),
      })),
      gap,
    ),
    spacer(7),
    rule(0.8, HAIR),
  ]);
}
