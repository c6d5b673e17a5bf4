import type { DataSource } from "typeorm";
import { lineUp } from "../../shared/contract/lineUp";
import type { Api } from "../http/api";
import { ownedCollectionRoutes } from "../http/ownedCollection.router";
import { lineUpsOf } from "./lineUps.service";

/** Who plays a song, and on what. */
export function lineUpsRoutes(api: Api, dataSource: DataSource): void {
  const contract = { name: "LineUp", schema: lineUp, plural: "line-ups", noun: "line-up" };
  ownedCollectionRoutes(api, contract, lineUpsOf(dataSource));
}
