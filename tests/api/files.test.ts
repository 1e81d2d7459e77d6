import { createHash } from "node:crypto";
import sharp from "sharp";
import { beforeAll, describe, expect, it, vi } from "vitest";
import type { FileAnswer } from "@/lib/api";
import { database } from "@/lib/server/data/database";
import { ownBucket, pdf, photoWithPlace, storedKeys, upload, uploaded, withoutStore } from "./support/files";
import { firstAdministrator, inCompany, newJob, ofAnotherCompany, onJob, type Person } from "./support/people";
import { request } from "./support/server";

let owner: Person & { companyId: string };
let twin: Person;
let job: string;
let entry: string;

beforeAll(async () => {
  await ownBucket();
  owner = await firstAdministrator();
  twin = await ofAnotherCompany();
  job = `/api/jobs/${await newJob(owner)}`;
  const library = await request("GET", `/api/companies/${owner.companyId}/library`, { as: owner });
  entry = `/api/library/${library.body.entries[0].id}`;
});

const sha = (bytes: Buffer) => createHash("sha256").update(bytes).digest("hex");
const listed = async (place = job): Promise<FileAnswer[]> => (await request("GET", `${place}/files`, { as: owner })).body.files;
/** Sends what must be refused, and sees that neither a row nor an object is left. */
async function refused(bytes: Buffer, name: string, purpose?: Parameters<typeof upload>[4]) {
  const [rows, keys] = [await database().StoredFile.count(), await storedKeys()];
  const answer = await upload(owner, job, bytes, name, purpose);
  expect(await database().StoredFile.count()).toBe(rows);
  expect(await storedKeys()).toEqual(keys);
  expect(answer.body).toMatchObject({ field: "file", requestId: expect.any(String) });
  return { status: answer.status, code: answer.body.code, detail: answer.body.detail as string };
}

describe("an upload", () => {
  it("is stored, listed, and given back as it came", async () => {
    const bytes = await pdf(3);
    const file = await uploaded(owner, job, bytes, "Plot plan.pdf");
    expect(file).toMatchObject({ name: "Plot plan.pdf", contentType: "application/pdf", bytes: bytes.length, digest: sha(bytes), pages: 3, widthPx: null, uploadedBy: "First Administrator", may: { remove: true } });
    expect(await listed()).toContainEqual(file);
    const back = await request("GET", `/api/files/${file.id}`, { as: owner });
    expect(back.bytes.equals(bytes)).toBe(true);
    expect(Object.fromEntries(back.headers)).toMatchObject({
      "content-type": "application/pdf", "content-security-policy": "default-src 'none'; sandbox", "x-content-type-options": "nosniff", etag: `"${file.digest}"`,
      "accept-ranges": "bytes", "content-length": String(bytes.length), "content-disposition": "attachment; filename=\"Plot plan.pdf\"; filename*=UTF-8''Plot%20plan.pdf",
    });
  });

  it("of the same bytes at two places is one object", async () => {
    const bytes = await pdf(1, "twice");
    const before = await storedKeys();
    const [one, other] = [await uploaded(owner, job, bytes), await uploaded(owner, entry, bytes, "sheet.pdf", "datasheet")];
    expect(one.id).not.toBe(other.id);
    expect((await storedKeys()).filter((key) => !before.includes(key))).toEqual([`files/${sha(bytes)}`]);
  });

  it("of a photo loses its place and camera, and stands upright", async () => {
    const photo = await photoWithPlace();
    // The photo of this test has a camera and a GPS block: tag 0x8825 of type LONG (Exif 2.32, 4.6.3), in either byte order.
    const { exif } = await sharp(photo).metadata();
    expect(exif?.includes("Camera of the tests")).toBe(true);
    expect(["2588040001000000", "8825000400000001"].some((tag) => exif?.includes(Buffer.from(tag, "hex")))).toBe(true);
    const file = await uploaded(owner, job, photo, "IMG_0001.JPG", "site photo");
    expect(file).toMatchObject({ name: "IMG_0001.JPG", contentType: "image/jpeg", widthPx: 40, heightPx: 60, pages: null });
    const { bytes } = await request("GET", `/api/files/${file.id}?inline`, { as: owner });
    const kept = await sharp(bytes).metadata();
    expect([kept.width, kept.height, kept.exif, kept.xmp, kept.iptc, kept.orientation]).toEqual([40, 60, undefined, undefined, undefined, undefined]);
    expect(bytes.includes("GPS") || bytes.includes("Camera of the tests") || bytes.includes("Exif")).toBe(false);
    // The color of the picture is still there: within 3 of 255 after two JPEG passes.
    const { channels } = await sharp(bytes).stats();
    [0xa8, 0x48, 0x1f].forEach((level, index) => expect(Math.abs((channels[index]?.mean ?? 0) - level)).toBeLessThan(3));
  });

  it("is kept under a name that can do no harm", async () => {
    const file = await uploaded(owner, job, await pdf(1, "name"), "../../<script>alert(1)</script>.pdf");
    expect(file.name).toBe("alert(1).pdf");
    const answer = await request("GET", `/api/files/${file.id}?inline`, { as: owner });
    expect(answer.headers.get("content-disposition")).toBe("inline; filename=\"alert(1).pdf\"; filename*=UTF-8''alert%281%29.pdf");
    expect((await database().StoredFile.findByPk(file.id))?.objectKey).toBe(`files/${file.digest}`);
  });

  it("is written down in the log of changes, and so is its removal", async () => {
    const file = await uploaded(owner, job, await pdf(1, "log"));
    await request("DELETE", `/api/files/${file.id}`, { as: owner });
    const entries = await database().AuditEntry.findAll({ where: { subject: `files/${file.id}` }, order: [["id", "ASC"]] });
    expect(entries.map((each) => [each.action, each.actorId, each.companyId, each.detail["digest"]])).toEqual([
      ["file.add", owner.id, owner.companyId, file.digest], ["file.remove", owner.id, owner.companyId, file.digest],
    ]);
  });
});

describe("what is refused", () => {
  it.each([
    ["text called a PDF", Buffer.from("The panel is in the barn.\n"), "panel.pdf", "is text"],
    ["a web page called a PDF", Buffer.from("<!DOCTYPE html><script>alert(1)</script>"), "letter.pdf", "is a web page"],
    ["a program called a picture", Buffer.from("MZ\x90\0\x03\0\0\0 program", "latin1"), "photo.jpg", "is a Windows program"],
    ["an archive called a PDF", Buffer.from("PK\x03\x04rest"), "plan.pdf", "is a ZIP archive"],
    ["a picture with script inside", Buffer.from("<svg xmlns='http://www.w3.org/2000/svg' onload='alert(1)'/>"), "logo.png", "is an SVG picture"],
    ["a web page with a PDF behind it", Buffer.from("<html>%PDF-1.7\n%%EOF"), "both.pdf", "is a web page"],
  ])("%s, and it is said what it is", async (_, bytes, name, words) => {
    const answer = await refused(bytes, name);
    expect(answer).toMatchObject({ status: 422, code: "file-type" });
    expect(answer.detail).toContain(words);
  });

  it("a picture where a datasheet is asked for", async () => {
    const answer = await refused(await sharp({ create: { width: 4, height: 4, channels: 3, background: "#fff" } }).png().toBuffer(), "data.pdf", "datasheet");
    expect(answer).toEqual({ status: 422, code: "file-type", detail: "file: is a PNG picture, whatever its name says; a datasheet is a PDF" });
  });

  it("a file of 0 bytes", async () => {
    expect(await refused(Buffer.alloc(0), "plan.pdf")).toEqual({ status: 422, code: "file-empty", detail: "file: is empty (0 bytes)" });
  });

  it("more than 20 MB", async () => {
    expect(await refused(Buffer.alloc(20 * 1024 * 1024 + 1, "%PDF-"), "plan.pdf")).toMatchObject({ status: 413, code: "file-too-large" });
  });

  it("a small file that unpacks to more than 48.5 megapixels, before it is unpacked", async () => {
    const bomb = await sharp({ create: { width: 9000, height: 6000, channels: 3, background: "#fff" } }).png({ compressionLevel: 9 }).toBuffer();
    expect(bomb.length).toBeLessThan(1024 * 1024);
    const answer = await refused(bomb, "roof.png", "site photo");
    expect(answer).toMatchObject({ status: 422, code: "file-pixels" });
    expect(answer.detail).toBe("file: has 9000 × 6000 px, 54 megapixels; at most 48.5 are taken");
  });

  it.each(["png", "jpeg", "webp"] as const)("a %s that was cut off", async (format) => {
    const whole = await sharp({ create: { width: 300, height: 200, channels: 3, background: "#888", noise: { type: "gaussian", mean: 128, sigma: 40 } } }).toFormat(format).toBuffer();
    expect(await refused(whole.subarray(0, whole.length / 2), `photo.${format}`)).toMatchObject({ status: 422, code: "file-damaged" });
  });

  it("a PDF that was cut off, and one that is none after its header", async () => {
    const whole = await pdf(2);
    expect(await refused(whole.subarray(0, whole.length / 2), "plan.pdf")).toMatchObject({ status: 422, code: "file-damaged" });
    expect(await refused(Buffer.from(`%PDF-1.7\n${"nothing ".repeat(200)}\n%%EOF\n`), "plan.pdf")).toMatchObject({ status: 422, code: "file-damaged" });
  });

  it.each([["purpose=document", "name"], ["name=a.pdf&purpose=poem", "purpose"], ["name=a.pdf&purpose=document&folder=/etc", "folder"]])("a question with %s", async (query, field) => {
    const answer = await request("POST", `${job}/files?${query}`, { as: owner, raw: new Uint8Array(await pdf()) });
    expect(answer).toMatchObject({ status: 422, body: { field } });
  });
});

describe("when the store is down", () => {
  it("an upload says that nothing is lost, leaves nothing, and works when sent again", async () => {
    const bytes = await pdf(1, "store down");
    const rows = await database().StoredFile.count();
    const down = await withoutStore(() => upload(owner, job, bytes));
    expect(down).toMatchObject({ status: 503, body: { code: "store-down" } });
    expect(down.body.detail).toMatch(/nothing was lost\. Try again/);
    expect(Number(down.headers.get("retry-after"))).toBeGreaterThan(0);
    expect(await database().StoredFile.count()).toBe(rows);
    const file = await uploaded(owner, job, bytes);
    expect((await request("GET", `/api/files/${file.id}`, { as: owner })).bytes.equals(bytes)).toBe(true);
  });

  it("a download says so too, and the file is there afterwards", async () => {
    const file = await uploaded(owner, job, await pdf(1, "read later"));
    expect(await withoutStore(() => request("GET", `/api/files/${file.id}`, { as: owner }))).toMatchObject({ status: 503, body: { code: "store-down" } });
    expect((await request("GET", `/api/files/${file.id}`, { as: owner })).status).toBe(200);
  });
});

describe("a row that cannot be written", () => {
  it("takes its object out again, unless another file needs it", async () => {
    const { sequelize } = database();
    await sequelize.query("create function refuse_row() returns trigger language plpgsql as $$ begin raise exception 'refused by the test'; end $$");
    const [fresh, known] = [await pdf(1, "fresh"), await pdf(1, "known")];
    await uploaded(owner, job, known);
    await sequelize.query("create trigger refuse before insert on stored_files for each row execute function refuse_row()");
    const before = await storedKeys();
    // The cause goes to the log, at length.
    vi.spyOn(console, "error").mockImplementation(() => undefined);
    expect((await upload(owner, job, fresh)).status).toBe(500);
    expect((await upload(owner, job, known)).status).toBe(500);
    vi.restoreAllMocks();
    await sequelize.query("drop trigger refuse on stored_files");
    expect(await storedKeys()).toEqual(before);
    expect(before).toContain(`files/${sha(known)}`);
    expect((await upload(owner, job, fresh)).status).toBe(201);
  });
});

describe("who may", () => {
  it("nobody of another company, by any address", async () => {
    const files = [await uploaded(owner, job, await pdf(1, "secret")), await uploaded(owner, entry, await pdf(1, "own datasheet"), "d.pdf", "datasheet")];
    const picture = await uploaded(owner, job, await photoWithPlace(), "x.jpg", "site photo");
    for (const { id } of [...files, picture]) {
      for (const query of ["", "?inline", "?width=320"]) {
        expect(await request("GET", `/api/files/${id}${query}`, { as: twin })).toMatchObject({ status: 404, body: { code: "not-found" } });
        expect((await request("GET", `/api/files/${id}${query}`)).status).toBe(401);
      }
      expect((await request("GET", `/api/files/${id}`, { as: twin, headers: { "if-none-match": `"${files[0]?.digest}"`, range: "bytes=0-3" } })).status).toBe(404);
      expect((await request("DELETE", `/api/files/${id}`, { as: twin })).status).toBe(404);
      expect((await request("GET", `/api/files/${id}`, { as: owner })).status).toBe(200);
    }
    for (const place of [job, entry]) {
      expect((await request("GET", `${place}/files`, { as: twin })).status).toBe(404);
      expect((await upload(twin, place, await pdf())).status).toBe(404);
    }
  });

  it("an installer reads and adds, and removes nothing; a permit clerk sees none", async () => {
    const jobId = job.split("/").at(-1) ?? "";
    const [installer, clerk] = [await onJob(owner, jobId, ["installer"]), await onJob(owner, jobId, ["permit clerk"])];
    const file = await uploaded(installer, job, await photoWithPlace(), "meter.jpg", "site photo");
    expect(file.may).toEqual({ remove: false });
    expect((await request("GET", `/api/files/${file.id}`, { as: installer })).status).toBe(200);
    expect((await request("DELETE", `/api/files/${file.id}`, { as: installer })).status).toBe(403);
    expect((await request("GET", `${job}/files`, { as: clerk })).status).toBe(403);
    expect((await request("GET", `/api/files/${file.id}`, { as: clerk })).status).toBe(403);
    expect((await upload(clerk, job, await pdf())).status).toBe(403);
  });

  it("a guest of one job reads the library's datasheets and changes none; another job's files stay closed", async () => {
    const guest = await onJob(owner, await newJob(owner), ["designer"]);
    const sheet = await uploaded(owner, entry, await pdf(1, "for guests"), "d.pdf", "datasheet");
    const secret = await uploaded(owner, job, await pdf(1, "of another job"));
    expect((await request("GET", `${entry}/files`, { as: guest })).body.files).toContainEqual(expect.objectContaining({ id: sheet.id, may: { remove: false } }));
    expect((await request("GET", `/api/files/${sheet.id}`, { as: guest })).status).toBe(200);
    expect((await request("DELETE", `/api/files/${sheet.id}`, { as: guest })).status).toBe(403);
    expect((await upload(guest, entry, await pdf(), "d.pdf", "datasheet")).status).toBe(404);
    expect((await request("GET", `/api/files/${secret.id}`, { as: guest })).status).toBe(404);
    const clerk = await onJob(owner, await newJob(owner), ["permit clerk"]);
    expect((await request("GET", `/api/files/${sheet.id}`, { as: clerk })).status).toBe(404);
  });

  it("a colleague of the company with a role that reads the library adds nothing to it", async () => {
    const installer = await inCompany(owner, owner.companyId, ["installer"]);
    expect((await request("GET", `${entry}/files`, { as: installer })).status).toBe(200);
    expect((await upload(installer, entry, await pdf(), "d.pdf", "datasheet")).status).toBe(403);
  });
});

describe("a removed file", () => {
  it("is gone for everyone, its bytes stay, and the table lets nobody take or change it", async () => {
    const file = await uploaded(owner, job, await pdf(1, "removed"));
    expect((await request("DELETE", `/api/files/${file.id}`, { as: owner })).status).toBe(204);
    expect((await request("GET", `/api/files/${file.id}`, { as: owner })).status).toBe(404);
    expect((await request("DELETE", `/api/files/${file.id}`, { as: owner })).status).toBe(404);
    expect((await listed()).map((each) => each.id)).not.toContain(file.id);
    expect(await storedKeys()).toContain(`files/${file.digest}`);
    const { sequelize } = database();
    await expect(sequelize.query("delete from stored_files where id = :id", { replacements: { id: file.id } })).rejects.toThrow(/only marked as removed/);
    await expect(sequelize.query("update stored_files set digest = repeat('0', 64) where id = :id", { replacements: { id: file.id } })).rejects.toThrow(/only marked as removed/);
  });
});
