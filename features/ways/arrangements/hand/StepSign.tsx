import Svg, { Circle, Path } from "react-native-svg";
import type { Step } from "@/shared/ways/hand/strokePattern";

/** What the right hand does, as on the sheet: arrows, a dot for the bass, a ring for a plucked string, a dash for rest. */
export function StepSign({ step, color }: { step: Step; color: string }) {
  const line = { stroke: color, strokeWidth: 2, strokeLinecap: "round", fill: "none" } as const;
  return (
    <Svg width={24} height={24} viewBox="0 0 24 24" aria-hidden>
      {step === "down" && <Path d="M12 4v15M7.5 14.5 12 19l4.5-4.5" {...line} />}
      {step === "up" && <Path d="M12 20V5M7.5 9.5 12 5l4.5 4.5" {...line} />}
      {step === "bass" && <Circle cx={12} cy={12} r={5} fill={color} />}
      {step === "pluck" && <Circle cx={12} cy={12} r={5} {...line} />}
      {step === "rest" && <Path d="M9 12h6" {...line} />}
    </Svg>
  );
}
