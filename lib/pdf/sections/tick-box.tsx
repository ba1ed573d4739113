import { Path, Svg } from "@react-pdf/renderer";
import { INK } from "../theme";

export const TICK_BOX = 11;

export function TickBox({ isTicked }: { isTicked: boolean }) {
  return (
    <Svg width={TICK_BOX} height={TICK_BOX} viewBox="0 0 11 11">
      <Path d="M0.6 0.6H10.4V10.4H0.6Z" fill="none" stroke={INK} strokeWidth={1.1} />
      {isTicked ? <Path d="M2.4 5.8L4.6 8.2L8.8 2.8" fill="none" stroke={INK} strokeWidth={1.6} /> : null}
    </Svg>
  );
}
