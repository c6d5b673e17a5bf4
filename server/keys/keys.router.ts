import type { DataSource } from "typeorm";
import { decision } from "../../shared/contract/decision";
import { songTry } from "../../shared/contract/try";
import type { Api } from "../http/api";
import { ownedCollectionRoutes } from "../http/ownedCollection.router";
import { decisionsOf } from "./decisions.service";
import { triesOf } from "./tries.service";

/** Decided keys, and songs tried in a key. */
export function keysRoutes(api: Api, dataSource: DataSource): void {
  const decisions = { name: "Decision", schema: decision, plural: "decisions", noun: "decision" };
  ownedCollectionRoutes(api, decisions, decisionsOf(dataSource));
  const tries = { name: "Try", schema: songTry, plural: "tries", noun: "try" };
  ownedCollectionRoutes(api, tries, triesOf(dataSource));
}
