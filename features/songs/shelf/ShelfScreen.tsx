import type { ReactNode } from "react";
import { View } from "react-native";
import { LinkButton } from "@/features/ui/LinkButton";
import { Screen } from "@/features/ui/Screen";
import { useLayout } from "@/features/ui/useLayout";
import { SignedOutNotice } from "../SignedOut";
import { SongShelf, type SongShelfProps } from "./SongShelf";

/** The page of all songs; `children` stand over the shelf. */
export function ShelfScreen({ children, ...shelf }: SongShelfProps & { children: ReactNode }) {
  const phone = useLayout() === "phone";
  return (
    <Screen
      title="Songs"
      wide
      footer={
        <View style={{ flexDirection: "row", gap: 10 }}>
          <LinkButton
            href="/songs/import"
            label="Import"
            kind="secondary"
            small={!phone}
            testID="import-songs"
            style={phone ? { flexGrow: 1 } : null}
          />
          <LinkButton
            href="/songs/new"
            label="Add a song"
            icon="plus"
            small={!phone}
            testID="add-song"
            style={phone ? { flexGrow: 2 } : null}
          />
        </View>
      }
    >
      {children}
      <SignedOutNotice />
      <SongShelf {...shelf} />
    </Screen>
  );
}
