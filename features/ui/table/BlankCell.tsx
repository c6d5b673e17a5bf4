import { colors } from "../theme";
import { unseen } from "../unseen";

/** A dash where a row has nothing in a column; `words` say so to whoever does not see it. */
export function BlankCell({ words }: { words: string }) {
  return (
    <>
      <span aria-hidden style={{ color: colors.inkSoft }}>
        –
      </span>
      <span style={unseen}>{words}</span>
    </>
  );
}
