import type { DataSource } from "typeorm";
import { arrangement } from "../../shared/contract/arrangement";
import type { Api } from "../http/api";
import { ownedCollectionRoutes } from "../http/ownedCollection.router";
import { arrangementsOf } from "./arrangements.service";

export function arrangementsRoutes(api: Api, dataSource: DataSource): void {
  const arrangements = { name: "Arrangement", schema: arrangement, plural: "arrangements", noun: "arrangement" };
  ownedCollectionRoutes(api, arrangements, arrangementsOf(dataSource));
}
