import { View } from "react-native";
import { useSession } from "@/features/api/SessionProvider";
import { Notice } from "@/features/ui/Notice";

/** The first thing one sees after signing up or in; nothing on a later visit to the same address signed out. */
export function EnteredNotice({ entered }: { entered: string | undefined }) {
  const { status } = useSession();
  if (entered === undefined || status !== "signed-in") return null;
  return (
    <View style={{ marginBottom: 16 }}>
      <Notice kind="good" testID="entered">
        You are signed in; what you did here is in your account.
      </Notice>
    </View>
  );
}
