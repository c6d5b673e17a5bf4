import { Column, Entity } from "typeorm";
import type { PlayerWishes } from "../../shared/contract/playerWishes";
import { isoInstant, OwnedEntity } from "../database/owned.entity";

@Entity("player_wishes")
export class PlayerWishesEntity extends OwnedEntity implements PlayerWishes {
  @Column({ type: "boolean", name: "no_barre" })
  noBarre!: boolean;

  @Column({ type: "boolean", name: "no_capo" })
  noCapo!: boolean;

  @Column({ type: "boolean", name: "never_retune" })
  neverRetune!: boolean;

  @Column({ type: "boolean", name: "keep_ringing" })
  keepRinging!: boolean;

  @Column({ type: "smallint", name: "highest_capo" })
  highestCapo!: number;

  @Column({ type: "jsonb" })
  known!: PlayerWishes["known"];

  @Column({ type: "timestamptz", name: "changed_at", transformer: isoInstant })
  changedAt!: string;
}
