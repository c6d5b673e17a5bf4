import type { DataSource } from "typeorm";
import { decision } from "../../shared/contract/decision";
import type { Api } from "../http/api";
import { ownedCollectionRoutes } from "../http/ownedCollection.router";
import { decisionsOf } from "./decisions.service";

export function decisionsRoutes(api: Api, dataSource: DataSource): void {
  const decisions = { name: "Decision", schema: decision, plural: "decisions", noun: "decision" };
  ownedCollectionRoutes(api, decisions, decisionsOf(dataSource));
}
