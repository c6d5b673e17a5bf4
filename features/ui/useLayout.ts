import { useWindowDimensions } from "react-native";
import { sizes } from "./theme";

export type Layout = "phone" | "middle" | "wide";

/** Which of the three layouts a window of this width gets. */
export function layoutFor(width: number): Layout {
  if (width >= sizes.wideFrom) return "wide";
  return width >= sizes.middleFrom ? "middle" : "phone";
}

export function useLayout(): Layout {
  return layoutFor(useWindowDimensions().width);
}
