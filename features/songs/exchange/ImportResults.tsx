import { View } from "react-native";
import { Icon, type IconName } from "@/features/ui/Icon";
import { Text } from "@/features/ui/Text";
import { TextLink } from "@/features/ui/TextLink";
import { colors } from "@/features/ui/theme";
import type { ImportResult } from "./importRun";

/** Results that are shown before one asks for all of a kind. */
const most = 200;

const looks: Record<ImportResult["outcome"], { icon: IconName; color: string }> = {
  refused: { icon: "warning", color: colors.brick },
  known: { icon: "again", color: colors.honeyText },
  imported: { icon: "check", color: colors.lagoon },
};
const order = ["refused", "known", "imported"] as const;

/** What became of each file and song; what went wrong stands first. */
export function ImportResults({ results, done }: { results: readonly ImportResult[]; done: boolean }) {
  const sorted = order.flatMap((outcome) => results.filter((each) => each.outcome === outcome));
  return (
    <View>
      <View role="list" aria-label="What became of each file" testID="import-results">
        {sorted.slice(0, most).map((result, index) => (
          <View
            role="listitem"
            key={index}
            testID={`import-${result.outcome}`}
            style={{
              flexDirection: "row",
              gap: 10,
              paddingVertical: 10,
              borderBottomWidth: 1,
              borderColor: colors.line,
            }}
          >
            <Icon name={looks[result.outcome].icon} size={20} color={looks[result.outcome].color} />
            <View style={{ flexShrink: 1, flexGrow: 1, minWidth: 0, gap: 2 }}>
              <Text variant="strong">{result.title ?? result.file}</Text>
              <Words result={result} done={done} />
            </View>
          </View>
        ))}
      </View>
      {sorted.length > most && (
        <Text variant="small" tone="soft" style={{ paddingTop: 10 }}>
          {`And ${sorted.length - most} more.`}
        </Text>
      )}
    </View>
  );
}

function Words({ result, done }: { result: ImportResult; done: boolean }) {
  const from = result.title === null || result.title === result.file ? "" : `${result.file}: `;
  if (result.outcome === "refused")
    return (
      <Text variant="small" tone="brick">
        {from === "" ? `Not imported. ${result.reason}` : `${from}not imported. ${result.reason}`}
      </Text>
    );
  const link = (label: string) =>
    done ? <TextLink href={{ pathname: "/songs/[id]", params: { id: result.id } }}>{label}</TextLink> : null;
  if (result.outcome === "known")
    return (
      <Text variant="small" tone="soft">
        {`${from}you have this already, as `}
        {link(`“${result.as}”`) ?? `“${result.as}”`}. It was not imported again.
      </Text>
    );
  return (
    <>
      <Text variant="small" tone="soft">
        {done ? `${from}imported. ` : `${from}read. `}
        {link("Open")}
      </Text>
      {result.cautions.length > 0 && (
        <Text variant="small" tone="honey" testID="import-cautions">
          {result.cautions.join(" ")}
        </Text>
      )}
    </>
  );
}
