import type { ObjectStoreSettings } from './stage/object-store';
import type { PictureSize } from './stage/stage';

/** What the seed needs to know, under the names of the api's environment. */
export type SeedSettings = {
  /** A superuser's address: the seed takes on the role of the tables' owner, whom nobody else may act as here. */
  readonly databaseUrl: string;
  readonly passwordPepper: string;
  readonly passwordCost: number;
  readonly objectStore: ObjectStoreSettings;
  readonly pictureSize: PictureSize;
};

const PICTURE: PictureSize = { widthPx: 1600, heightPx: 1200 };

/** @throws Error naming the first variable that is missing */
export function readSeedSettings(environment: Readonly<Record<string, string | undefined>>): SeedSettings {
  const needed = (name: string) => {
    const value = environment[name];
    if (value === undefined || value === '') throw new Error(`${name} is not set: the demo shop is put in by npm start.`);
    return value;
  };
  return {
    databaseUrl: needed('SEED_DATABASE_URL'),
    passwordPepper: needed('PASSWORD_PEPPER'),
    passwordCost: Number(needed('PASSWORD_COST')),
    objectStore: {
      endpoint: needed('OBJECT_STORE_ENDPOINT'),
      bucket: needed('OBJECT_STORE_BUCKET'),
      accessKeyId: needed('OBJECT_STORE_ACCESS_KEY'),
      secretAccessKey: needed('OBJECT_STORE_SECRET_KEY'),
    },
    pictureSize: PICTURE,
  };
}
