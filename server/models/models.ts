import type { Sequelize } from 'sequelize';
import { devicePersonTable, deviceTable, refreshFamilyTable } from './device.ts';
import { boatOwnerTable, personTable } from './person.ts';
import { pictureFileTable } from './picture-file.ts';
import {
  boatTable,
  entryTable,
  looseEndTable,
  opTable,
  setAsideTable,
  stageTable,
  taskTable,
} from './record.ts';
import { installationTable, knownShopTable, shopTable } from './shop.ts';

/** The models of one pool; they are not shared, since a process may hold several databases. */
export function defineModels(sequelize: Sequelize) {
  return {
    Installation: installationTable(sequelize),
    KnownShop: knownShopTable(sequelize),
    Shop: shopTable(sequelize),
    Person: personTable(sequelize),
    Device: deviceTable(sequelize),
    DevicePerson: devicePersonTable(sequelize),
    RefreshFamily: refreshFamilyTable(sequelize),
    BoatOwner: boatOwnerTable(sequelize),
    Op: opTable(sequelize),
    Boat: boatTable(sequelize),
    Stage: stageTable(sequelize),
    Task: taskTable(sequelize),
    Entry: entryTable(sequelize),
    LooseEnd: looseEndTable(sequelize),
    SetAside: setAsideTable(sequelize),
    PictureFile: pictureFileTable(sequelize),
  };
}

export type Models = ReturnType<typeof defineModels>;
