import { useWindowDimensions } from "react-native";
import { sizes } from "../theme";

/** Width of a page's content on wide screens, px: what a table's columns share. */
export function useContentRoom(): number {
  return Math.min(sizes.content, useWindowDimensions().width - sizes.rail - 2 * sizes.gutterWide);
}
