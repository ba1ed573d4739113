import { asTyped, dropEmpty, scale, type Typed } from "./typed-values";

const METRES_PER_CENTIMETRE = 0.01;

/** A reading as the form has it: depths in centimetres, what was left empty not there. */
export function readPullTest(value: unknown): Typed {
  const reading = asTyped(value);
  const depths = {
    depthOutM: scale(reading.depthOutM, METRES_PER_CENTIMETRE),
    looseTopM: scale(reading.looseTopM, METRES_PER_CENTIMETRE),
    stoneDepthM: scale(reading.stoneDepthM, METRES_PER_CENTIMETRE),
  };
  return dropEmpty({ ...reading, ...dropEmpty(depths) });
}
