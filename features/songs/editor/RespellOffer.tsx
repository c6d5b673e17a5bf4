import { useDeferredValue, useMemo } from "react";
import { Button } from "@/features/ui/Button";
import { Notice } from "@/features/ui/Notice";
import type { KeyName } from "@/shared/music/keyName";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import { respellChart } from "@/shared/songs/respellChart";

const shown = 4;

/** Where chords are called otherwise than their key calls them, one touch sets them right. */
export function RespellOffer({
  text,
  writtenKey,
  onText,
}: {
  text: string;
  writtenKey: KeyName | null;
  onText: (text: string) => void;
}) {
  const read = useDeferredValue(text);
  const offer = useMemo(() => writtenKey && respellChart(read, writtenKey), [read, writtenKey]);
  if (!offer || !writtenKey) return null;
  const sign = glyphs(keySign(writtenKey));
  const some = offer.changes.slice(0, shown).map(({ from, to }) => `${glyphs(to)} for ${glyphs(from)}`);
  const more = offer.changes.length - some.length;
  return (
    <Notice
      kind="caution"
      testID="respell"
      title={`Some chords are not spelled as in ${sign}`}
      action={
        <Button
          kind="text"
          small
          label={`Respell in ${sign}`}
          onPress={() => onText(read === text ? offer.text : (respellChart(text, writtenKey)?.text ?? text))}
          testID="respell-now"
        />
      }
    >
      {`In ${sign} one writes ${some.join(", ")}${more > 0 ? ` and ${more} more` : ""}. They sound the same.`}
    </Notice>
  );
}
