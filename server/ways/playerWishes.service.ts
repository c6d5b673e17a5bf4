import type { DataSource } from "typeorm";
import type { PlayerWishes } from "../../shared/contract/playerWishes";
import { OwnedCollection } from "../http/ownedCollection.service";
import { PlayerWishesEntity } from "./playerWishes.entity";

/** One is enough; a few more may come together when devices move into an account. */
const mostItems = 20;

export function playerWishesOf(dataSource: DataSource) {
  const options = { noun: "set of wishes", mostItems };
  return new OwnedCollection<PlayerWishes, PlayerWishesEntity>(dataSource, PlayerWishesEntity, options);
}
