import type { DataSource } from "typeorm";
import { playerWishes } from "../../shared/contract/playerWishes";
import type { Api } from "../http/api";
import { ownedCollectionRoutes } from "../http/ownedCollection.router";
import { playerWishesOf } from "./playerWishes.service";

export function playerWishesRoutes(api: Api, dataSource: DataSource): void {
  const wishes = { name: "PlayerWishes", schema: playerWishes, plural: "wishes", noun: "set of wishes" };
  ownedCollectionRoutes(api, wishes, playerWishesOf(dataSource));
}
