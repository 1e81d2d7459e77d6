import { createHash, randomUUID } from "node:crypto";
import { promises as fs } from "node:fs";
import path from "node:path";

export interface StoredObject {
  key: string;
  size: number;
  etag: string;
  contentType: string;
  metadata: Record<string, string>;
  modified: string;
  /** Name of the file with the bytes. */
  file: string;
}

const hash = (text: string) => createHash("sha256").update(text).digest("hex");

/**
 * Objects as files under one folder. The small description file is written last and in one step,
 * so an object is either there whole or not at all, even after a kill.
 */
export class ObjectFiles {
  constructor(private readonly root: string) {}

  private bucketFolder(bucket: string): string {
    return path.join(this.root, bucket);
  }

  private descriptionFile(bucket: string, key: string): string {
    return path.join(this.bucketFolder(bucket), `${hash(key)}.json`);
  }

  async createBucket(bucket: string): Promise<void> {
    await fs.mkdir(this.bucketFolder(bucket), { recursive: true });
  }

  async hasBucket(bucket: string): Promise<boolean> {
    return fs.stat(this.bucketFolder(bucket)).then((stat) => stat.isDirectory(), () => false);
  }

  /** Description of an object, or null when there is none. */
  async describe(bucket: string, key: string): Promise<StoredObject | null> {
    try {
      return JSON.parse(await fs.readFile(this.descriptionFile(bucket, key), "utf8")) as StoredObject;
    } catch {
      return null;
    }
  }

  async read(bucket: string, object: StoredObject): Promise<Buffer> {
    return fs.readFile(path.join(this.bucketFolder(bucket), object.file));
  }

  /** Stores an object; with `onlyIfAbsent` an existing one is kept and null comes back. */
  async write(
    bucket: string,
    key: string,
    body: Buffer,
    about: Pick<StoredObject, "contentType" | "metadata">,
    onlyIfAbsent: boolean,
  ): Promise<StoredObject | null> {
    const folder = this.bucketFolder(bucket);
    const object: StoredObject = {
      key,
      size: body.length,
      // The protocol's own digest of a single-part object is MD5.
      etag: createHash("md5").update(body).digest("hex"),
      ...about,
      modified: new Date().toISOString(),
      file: `${hash(key)}.${randomUUID()}.bytes`,
    };
    await fs.writeFile(path.join(folder, object.file), body);
    const draft = path.join(folder, `${object.file}.draft`);
    await fs.writeFile(draft, JSON.stringify(object));
    const target = this.descriptionFile(bucket, key);
    const before = await this.describe(bucket, key);
    try {
      if (onlyIfAbsent) {
        // A link fails when the name is taken, so of two writers one wins.
        await fs.link(draft, target);
        await fs.unlink(draft);
      } else {
        await fs.rename(draft, target);
        if (before) await fs.rm(path.join(folder, before.file), { force: true });
      }
      return object;
    } catch (error) {
      await fs.rm(draft, { force: true });
      await fs.rm(path.join(folder, object.file), { force: true });
      if ((error as NodeJS.ErrnoException).code === "EEXIST") return null;
      throw error;
    }
  }

  async remove(bucket: string, key: string): Promise<void> {
    const object = await this.describe(bucket, key);
    await fs.rm(this.descriptionFile(bucket, key), { force: true });
    if (object) await fs.rm(path.join(this.bucketFolder(bucket), object.file), { force: true });
  }

  /** Objects whose key begins with `prefix`, in key order. */
  async list(bucket: string, prefix: string): Promise<StoredObject[]> {
    const names = (await fs.readdir(this.bucketFolder(bucket))).filter((name) => name.endsWith(".json"));
    const objects = await Promise.all(
      names.map(async (name) => JSON.parse(await fs.readFile(path.join(this.bucketFolder(bucket), name), "utf8")) as StoredObject),
    );
    return objects.filter((object) => object.key.startsWith(prefix)).sort((a, b) => (a.key < b.key ? -1 : a.key > b.key ? 1 : 0));
  }
}
