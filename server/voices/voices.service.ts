import type { DataSource } from "typeorm";
import type { Take } from "../../shared/contract/take";
import type { Voice } from "../../shared/contract/voice";
import { dropDoubleDecisions } from "../keys/decisions.service";
import { OwnedCollection } from "../http/ownedCollection.service";
import { TakeEntity } from "./take.entity";
import { VoiceEntity } from "./voice.entity";

export function voicesOf(dataSource: DataSource) {
  return new OwnedCollection<Voice, VoiceEntity>(dataSource, VoiceEntity, {
    noun: "voice",
    beforeRemove: dropDoubleDecisions,
  });
}

export function takesOf(dataSource: DataSource) {
  return new OwnedCollection<Take, TakeEntity>(dataSource, TakeEntity, { noun: "take" });
}
