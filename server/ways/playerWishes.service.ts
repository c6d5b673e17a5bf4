import type { DataSource } from "typeorm";
import type { PlayerWishes } from "../../shared/contract/playerWishes";
import { OwnedCollection } from "../http/ownedCollection.service";
import { PlayerWishesEntity } from "./playerWishes.entity";

export function playerWishesOf(dataSource: DataSource) {
  return new OwnedCollection<PlayerWishes, PlayerWishesEntity>(dataSource, PlayerWishesEntity, {
    noun: "set of wishes",
  });
}
