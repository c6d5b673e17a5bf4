import { ImportScreen } from "@/features/songs/exchange/ImportScreen";

export default function ImportRoute() {
  return <ImportScreen />;
}
