import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type NonAttribute,
  type Sequelize,
} from 'sequelize';
import { id, instant, real, required, text, whole } from './columns';

export class Vendor extends Model<InferAttributes<Vendor>, InferCreationAttributes<Vendor>> {
  declare id: CreationOptional<number>;
  declare name: string;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export class Module extends Model<InferAttributes<Module>, InferCreationAttributes<Module>> {
  declare id: CreationOptional<number>;
  declare vendorId: number;
  declare partNumber: string;
  declare variant: CreationOptional<string>;
  declare stages: number | null;
  declare couples: number | null;
  declare coldPlateWidthMm: number | null;
  declare coldPlateDepthMm: number | null;
  declare hotPlateWidthMm: number | null;
  declare hotPlateDepthMm: number | null;
  declare heightMm: number | null;
  declare maxTemperatureC: number | null;
  declare leadsOhm: number | null;
  declare sealing: string | null;
  declare acResistanceOhm: number | null;
  declare acResistanceAtC: number | null;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
  declare vendor?: NonAttribute<Vendor>;
  declare ratings?: NonAttribute<Rating[]>;
}

export class Rating extends Model<InferAttributes<Rating>, InferCreationAttributes<Rating>> {
  declare id: CreationOptional<number>;
  declare moduleId: number;
  declare hotSideC: number;
  declare imaxA: number | null;
  declare vmaxV: number | null;
  declare qmaxW: number | null;
  declare dTmaxK: number | null;
  declare imaxMeans: CreationOptional<'largestDeltaT' | 'mostHeat' | 'allowed' | 'notStated'>;
  declare basis: CreationOptional<'typical' | 'minimum' | 'calculated' | 'measured' | 'notStated'>;
  declare atmosphere: CreationOptional<'vacuum' | 'dryNitrogen' | 'air' | 'notStated'>;
  declare tolerancePercent: number | null;
}

export class Sheet extends Model<InferAttributes<Sheet>, InferCreationAttributes<Sheet>> {
  declare id: CreationOptional<number>;
  declare vendorId: number;
  declare title: CreationOptional<string>;
  declare number: CreationOptional<string>;
  declare revision: CreationOptional<string>;
  declare dated: CreationOptional<string>;
  declare obtainedFrom: CreationOptional<string>;
  declare obtainedOn: CreationOptional<string>;
  declare createdBy: string;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
  declare vendor?: NonAttribute<Vendor>;
  declare pages?: NonAttribute<Page[]>;
}

export class Picture extends Model<InferAttributes<Picture>, InferCreationAttributes<Picture>> {
  declare id: CreationOptional<number>;
  declare fileSha256: string;
  declare pngSha256: string;
  declare pixelsSha256: string;
  declare originalName: string;
  declare mediaType: string;
  declare bytes: number;
  declare width: number;
  declare height: number;
  declare notes: string;
  declare createdBy: string;
  declare createdAt: CreationOptional<Date>;
}

export class Page extends Model<InferAttributes<Page>, InferCreationAttributes<Page>> {
  declare id: CreationOptional<number>;
  declare sheetId: number;
  declare pictureId: number;
  declare position: number;
  declare label: CreationOptional<string>;
  declare createdAt: CreationOptional<Date>;
  declare picture?: NonAttribute<Picture>;
}

export function initParts(sequelize: Sequelize) {
  Vendor.init(
    { id: id(), name: required(), createdAt: instant('createdAt'), updatedAt: instant('updatedAt') },
    { sequelize, modelName: 'Vendor', tableName: 'vendors' },
  );
  Module.init(
    {
      id: id(),
      vendorId: whole(),
      partNumber: required(),
      variant: text(),
      stages: whole(),
      couples: whole(),
      coldPlateWidthMm: real(),
      coldPlateDepthMm: real(),
      hotPlateWidthMm: real(),
      hotPlateDepthMm: real(),
      heightMm: real(),
      maxTemperatureC: real(),
      leadsOhm: real(),
      sealing: text(),
      acResistanceOhm: real(),
      acResistanceAtC: real(),
      version: { ...whole(), defaultValue: 1 },
      createdAt: instant('createdAt'),
      updatedAt: instant('updatedAt'),
    },
    { sequelize, modelName: 'Module', tableName: 'modules' },
  );
  Rating.init(
    {
      id: id(),
      moduleId: whole(),
      hotSideC: real(),
      imaxA: real(),
      vmaxV: real(),
      qmaxW: real(),
      dTmaxK: { ...real(), field: 'dtmax_k' },
      imaxMeans: text(),
      basis: text(),
      atmosphere: text(),
      tolerancePercent: real(),
    },
    { sequelize, modelName: 'Rating', tableName: 'ratings', timestamps: false },
  );
  Sheet.init(
    {
      id: id(),
      vendorId: whole(),
      title: text(),
      number: text(),
      revision: text(),
      dated: text(),
      obtainedFrom: text(),
      obtainedOn: text(),
      createdBy: required(),
      version: { ...whole(), defaultValue: 1 },
      createdAt: instant('createdAt'),
      updatedAt: instant('updatedAt'),
    },
    { sequelize, modelName: 'Sheet', tableName: 'sheets' },
  );
  Picture.init(
    {
      id: id(),
      fileSha256: { ...required(), field: 'file_sha256' },
      pngSha256: { ...required(), field: 'png_sha256' },
      pixelsSha256: { ...required(), field: 'pixels_sha256' },
      originalName: required(),
      mediaType: required(),
      bytes: whole(),
      width: whole(),
      height: whole(),
      notes: required(),
      createdBy: required(),
      createdAt: instant('createdAt'),
    },
    { sequelize, modelName: 'Picture', tableName: 'pictures', updatedAt: false },
  );
  Page.init(
    { id: id(), sheetId: whole(), pictureId: whole(), position: whole(), label: text(), createdAt: instant('createdAt') },
    { sequelize, modelName: 'Page', tableName: 'pages', updatedAt: false },
  );
  Module.belongsTo(Vendor, { foreignKey: 'vendorId', as: 'vendor' });
  Module.hasMany(Rating, { foreignKey: 'moduleId', as: 'ratings' });
  Sheet.belongsTo(Vendor, { foreignKey: 'vendorId', as: 'vendor' });
  Sheet.hasMany(Page, { foreignKey: 'sheetId', as: 'pages' });
  Page.belongsTo(Picture, { foreignKey: 'pictureId', as: 'picture' });
}
