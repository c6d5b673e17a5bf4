import { useRouter } from "expo-router";
import { EditScreen } from "@/features/songs/editor/EditScreen";

export default function NewSongRoute() {
  const router = useRouter();
  return (
    <EditScreen song={null} onSaved={(song) => router.replace({ pathname: "/songs/[id]", params: { id: song.id } })} />
  );
}
