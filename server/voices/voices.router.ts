import type { DataSource } from "typeorm";
import { take } from "../../shared/contract/take";
import { voice } from "../../shared/contract/voice";
import type { Api } from "../http/api";
import { ownedCollectionRoutes } from "../http/ownedCollection.router";
import { takesOf, voicesOf } from "./voices.service";

export function voicesRoutes(api: Api, dataSource: DataSource): void {
  const voices = { name: "Voice", schema: voice, plural: "voices", noun: "voice", removes: "its takes and tries" };
  const takes = { name: "Take", schema: take, plural: "takes", noun: "take" };
  ownedCollectionRoutes(api, voices, voicesOf(dataSource));
  ownedCollectionRoutes(api, takes, takesOf(dataSource));
}
