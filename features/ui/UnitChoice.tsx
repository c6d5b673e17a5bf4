import { Segmented } from "./Segmented";
import { useUnits } from "./useUnits";

const options = [
  { value: "metric", label: "mm and kg" },
  { value: "imperial", label: "inches and lb" },
] as const;

/** In what lengths and tensions are told; kept on this device. */
export function UnitChoice() {
  const [units, setUnits] = useUnits();
  return <Segmented label="Units" options={options} value={units} onChange={setUnits} testID="units" />;
}
