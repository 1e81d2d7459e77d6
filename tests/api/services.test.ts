import { GetObjectCommand, PutObjectCommand, S3Client } from "@aws-sdk/client-s3";
import { createTransport } from "nodemailer";
import { QueryTypes, Sequelize } from "sequelize";
import { describe, expect, it } from "vitest";
import pg from "pg";
import { env } from "@/lib/server/env";

describe("the services a test runs on", () => {
  it("are a database made by the migrations, with the job queue in it", async () => {
    const sequelize = new Sequelize(env().DATABASE_URL, { dialect: "postgres", dialectModule: pg, logging: false });
    const applied = await sequelize.query<{ count: number }>("select count(*)::int as count from schema_migrations", { type: QueryTypes.SELECT });
    expect(applied[0]?.count).toBeGreaterThan(0);
    await sequelize.query("select graphile_worker.add_job('nothing', '{}')");
    await sequelize.close();
  });

  it("are an object store that gives back what it was given", async () => {
    const { S3_ENDPOINT, S3_REGION, S3_BUCKET, S3_ACCESS_KEY_ID, S3_SECRET_ACCESS_KEY, S3_FORCE_PATH_STYLE } = env();
    const client = new S3Client({
      endpoint: S3_ENDPOINT, region: S3_REGION, forcePathStyle: S3_FORCE_PATH_STYLE,
      credentials: { accessKeyId: S3_ACCESS_KEY_ID, secretAccessKey: S3_SECRET_ACCESS_KEY },
    });
    await client.send(new PutObjectCommand({ Bucket: S3_BUCKET, Key: "a", Body: "sheet" }));
    const answer = await client.send(new GetObjectCommand({ Bucket: S3_BUCKET, Key: "a" }));
    expect(await answer.Body?.transformToString()).toBe("sheet");
    client.destroy();
  });

  it("are a mail catcher that keeps recipients, text and attachments", async () => {
    const transport = createTransport(env().SMTP_URL);
    await transport.sendMail({
      from: env().MAIL_FROM, to: "clerk@example.com", bcc: "office@example.com", subject: "Permit ½ <b>set</b>", text: "The set is sealed.",
      attachments: [{ filename: "E-601.pdf", content: Buffer.from("%PDF-") }],
    });
    const messages: unknown = await (await fetch(`${process.env["FERRULE_TEST_MAIL_URL"]}/messages.json`)).json();
    expect(messages).toMatchObject([
      { to: ["clerk@example.com", "office@example.com"], subject: "Permit ½ <b>set</b>", attachments: [{ filename: "E-601.pdf", size: 5 }] },
    ]);
    const page = await (await fetch(`${process.env["FERRULE_TEST_MAIL_URL"]}/`)).text();
    expect(page).not.toContain("<b>set");
  });
});
