import { useRouter } from "expo-router";
import { EditScreen } from "@/features/songs/editor/EditScreen";

export default function NewSongRoute() {
  const router = useRouter();
  return <EditScreen song={null} onSaved={(id) => router.replace({ pathname: "/songs/[id]", params: { id } })} />;
}
