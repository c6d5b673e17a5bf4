import { useQuery } from "@tanstack/react-query";
import { useMemo, useState } from "react";
import { View } from "react-native";
import { http } from "@/features/api/httpClient";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Field } from "@/features/ui/Field";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import type { Part, PartChange } from "@/shared/contract/studio/assignment";
import type { RosterRow } from "@/shared/contract/studio/roster";
import { KeyLine, PartFit, PartKey, PartWay } from "../assign/AssignCells";
import { partRequest, pupilParts, wayMark, type PartDraft, type PartsOf } from "../assign/pupilParts";
import { useWaysOfParts, type UseWays } from "../assign/useWaysOfParts";
import { pupilKeys } from "../judge/askPupilKeys";
import { questionOf, type Piece } from "../judge/piece";
import { studioQueries, useStudioChange } from "../studioQueries";

export interface ChangePartProps {
  part: Part;
  /** the song as it was given; null where it has no key */
  piece: Piece | null;
  useWays: UseWays;
  instrumentOf: PartsOf["instrumentOf"];
}

/** Another key, way or note for one pupil, judged by their voice as it is now. */
export function ChangePart(props: ChangePartProps) {
  const { part, piece } = props;
  const [open, setOpen] = useState(false);
  const roster = useQuery({ ...studioQueries.roster(part.studio.id), enabled: open });
  if (!piece) return null;
  if (!open)
    return (
      <Button
        kind="text"
        flush
        small
        icon="edit"
        label="Change key, way or note"
        onPress={() => setOpen(true)}
        testID="change-part"
      />
    );
  return (
    <Card style={{ gap: 12 }}>
      <Heading level={2}>{`Change it for ${part.pupil}`}</Heading>
      <QueryState query={roster} title="The pupil could not be asked for">
        {(rows) => {
          const row = rows.find(({ memberId }) => memberId === part.memberId);
          return row && <Changing {...props} piece={piece} row={row} onDone={() => setOpen(false)} />;
        }}
      </QueryState>
    </Card>
  );
}

interface ChangingProps extends ChangePartProps {
  piece: Piece;
  row: RosterRow;
  onDone: () => void;
}

function Changing({ part, piece, row, useWays, instrumentOf, onDone }: ChangingProps) {
  const [draft, setDraft] = useState<PartDraft>({
    chosen: true,
    shift: part.shift,
    way: part.way && wayMark(part.way),
    note: part.partNote,
  });
  const question = useMemo(() => questionOf(piece, [row]), [piece, row]);
  const judged = useQuery(pupilKeys(question)).data;
  const changed = pupilParts({
    ...{ written: piece.written, pupils: [row], judged, asked: part.tonic, instrumentOf },
    drafts: new Map([[row.memberId, draft]]),
  })[0]!;
  const ways = useWaysOfParts(useWays, piece, [changed]).ways.get(row.memberId);
  const save = useStudioChange((change: PartChange) => http.put<Part>(`/parts/${part.id}`, change));
  const keep = () => {
    const { tonic, shift, instrument: on, way, note } = partRequest(changed, ways);
    save.mutate({ tonic, shift, instrument: on, way, partNote: note }, { onSuccess: onDone });
  };
  const change = (_memberId: string, next: Partial<PartDraft>) => setDraft((before) => ({ ...before, ...next }));
  return (
    <>
      <KeyLine>
        <PartKey part={changed} onDraft={change} />
        <PartFit part={changed} />
      </KeyLine>
      <PartWay part={changed} ways={ways} onDraft={change} />
      <Field
        label={`Note to ${part.pupil}`}
        value={draft.note}
        onChangeText={(note) => change(row.memberId, { note })}
        multiline
        rows={2}
        testID="change-note"
      />
      {save.error && (
        <Notice kind="error" title="Nothing was changed">
          {save.error.message}
        </Notice>
      )}
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 10 }}>
        <Button
          small
          label="Keep this"
          busy={save.isPending}
          disabled={ways === undefined}
          onPress={keep}
          testID="keep-part"
        />
        <Button small kind="text" label="Leave it as it is" onPress={onDone} />
      </View>
    </>
  );
}
