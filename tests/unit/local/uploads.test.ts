import { createHash } from "node:crypto";
import { existsSync, statSync } from "node:fs";
import { request } from "node:http";
import { join } from "node:path";
import { describe, expect, it } from "vitest";
import { UTFile } from "uploadthing/server";
import { postJson, until } from "./support";
import { API_KEY, aPhoto, aService, bytesOf, formOf, presign, put, send } from "./uploads-app";

const md5 = (bytes: Buffer) => createHash("md5").update(bytes).digest("hex");

describe("an upload from a page", () => {
  it("arrives, is reported under signature, and answers with what the application gave back", async () => {
    const { app } = await aService();
    const photo = aPhoto(300_000, "id=own1.jpg");
    const { url, key } = await presign(app.url, photo);
    const answer = await (await send(url, photo, photo.name)).json();
    expect(answer).toMatchObject({ serverData: { stored: "id=own1.jpg" }, fileHash: md5(await bytesOf(photo)) });
    expect(app.seen.completed).toMatchObject([{ key, customId: "own1", size: 300_000, fileHash: answer.fileHash, ufsUrl: answer.ufsUrl, metadata: { by: "Mae Alder" } }]);
  });

  it("in development is reported through the application's own open request", async () => {
    const { app } = await aService({ isDev: true });
    const { url, key } = await presign(app.url, aPhoto());
    expect(await (await send(url, aPhoto())).json()).toMatchObject({ serverData: { stored: "photo.jpg" } });
    expect(app.seen.completed.map((file) => file.key)).toEqual([key]);
  });

  it("answers with an error when the application's own step failed", async () => {
    const { app } = await aService();
    const { url } = await presign(app.url, aPhoto(10, "broken.jpg"));
    expect(await (await send(url, aPhoto(10, "broken.jpg"))).json()).toMatchObject({ error: "Failed to run onUploadComplete" });
  });

  it("takes 25 MB, writing them to disk as they come", async () => {
    const { app, utapi, folder } = await aService();
    const photo = aPhoto(25 * 1024 * 1024);
    const { url, key } = await presign(app.url, photo);
    const form = new Response(formOf(photo));
    const type = form.headers.get("content-type") ?? "";
    const body = await bytesOf(form);
    const half = request(url, { method: "PUT", headers: { "content-type": type, "content-length": body.length } });
    half.on("error", () => undefined);
    half.write(body.subarray(0, 10 * 1024 * 1024));
    await until(() => existsSync(join(folder, "partial", key)) && statSync(join(folder, "partial", key)).size > 9 * 1024 * 1024);
    half.destroy();
    expect((await send(url, photo)).status).toBe(200);
    const { ufsUrl } = await utapi.generateSignedURL(key);
    expect(md5(await bytesOf(await fetch(ufsUrl)))).toBe(md5(await bytesOf(photo)));
  });

  it("takes empty files and files that hold a look-alike of the form's own delimiters", async () => {
    const { app, utapi } = await aService();
    for (const content of ["", "\r\n--", "\r\n------formdata-undici-0\r\n\r\n".repeat(500), "\r\n".repeat(40_000)]) {
      const file = new File([content], "odd.jpg", { type: "image/jpeg" });
      const { url, key } = await presign(app.url, file);
      expect((await send(url, file, "odd.jpg")).status).toBe(200);
      const { ufsUrl } = await utapi.generateSignedURL(key);
      expect(await (await fetch(ufsUrl)).text()).toBe(content);
    }
  });
});

describe("what the ingest checks", () => {
  it("signature, expiry and application", async () => {
    const { app, url: serviceUrl } = await aService();
    const { url } = await presign(app.url, aPhoto());
    expect((await put(url.replace("x-ut-file-size=300000", "x-ut-file-size=300001"), aPhoto())).status).toBe(403);
    expect((await put(`${url}&x-ut-slug=other`, aPhoto())).status).toBe(403);
    expect((await put(url.replace(/&signature=.*/, ""), aPhoto())).status).toBe(403);
    expect((await put(`${serviceUrl}/${"k".repeat(40)}`, aPhoto())).status).toBe(403);
    expect((await fetch(url, { method: "HEAD" })).headers.get("x-ut-range-start")).toBe("0");
  });

  it("size and type against what was signed, and tells the application of a refusal", async () => {
    const { app, folder } = await aService();
    const larger = await presign(app.url, aPhoto(1000));
    expect((await put(larger.url, aPhoto(1001))).status).toBe(413);
    expect((await put(larger.url, aPhoto(200_000))).status).toBe(413);
    const smaller = await presign(app.url, aPhoto(1000));
    expect((await put(smaller.url, aPhoto(999))).status).toBe(400);
    const other = await presign(app.url, aPhoto(1000));
    expect((await put(other.url, aPhoto(1000, "page.html", "text/html"))).status).toBe(400);
    expect((await fetch(other.url, { method: "PUT", body: "no form" })).status).toBe(400);
    await until(() => new Set(app.seen.refused).size === 3);
    expect(existsSync(join(folder, "partial", larger.key))).toBe(false);
    expect(app.seen.completed).toEqual([]);
  });

  it("an own id only once in an application", async () => {
    const { app, utapi } = await aService();
    const photo = aPhoto(100, "id=twin.jpg");
    const [first, second] = [await presign(app.url, photo), await presign(app.url, photo)];
    expect((await send(first.url, photo, photo.name)).status).toBe(200);
    expect((await send(second.url, photo, photo.name)).status).toBe(400);
    await utapi.deleteFiles("twin", { keyType: "customId" });
    const third = await presign(app.url, photo);
    expect((await send(third.url, photo, photo.name)).status).toBe(200);
  });

  it("opens to pages of any origin", async () => {
    const { app } = await aService();
    const { url } = await presign(app.url, aPhoto());
    const preflight = await fetch(url, { method: "OPTIONS", headers: { origin: "http://localhost:3000", "access-control-request-method": "PUT" } });
    expect(preflight.headers.get("access-control-allow-methods")).toContain("PUT");
    for (const answer of [await fetch(url, { method: "HEAD" }), await send(url, aPhoto()), await fetch(`${url}x`)]) {
      expect(answer.headers.get("access-control-allow-origin")).toBe("*");
      expect(answer.headers.get("access-control-expose-headers")).toBe("*");
    }
  });
});

describe("going on after a cut", () => {
  it("keeps what arrived and takes the rest", async () => {
    const service = await aService();
    await postJson(`${service.url}/faults`, { kind: "cut-mid-file", afterBytes: 100_000, times: 1 });
    const { url, key } = await presign(service.app.url, aPhoto());
    await expect(send(url, aPhoto())).rejects.toThrow();
    expect((await fetch(url, { method: "HEAD" })).headers.get("x-ut-range-start")).toBe("100000");
    expect(await (await send(url, aPhoto())).json()).toMatchObject({ serverData: { stored: "photo.jpg" }, fileHash: md5(await bytesOf(aPhoto())) });
    expect(service.app.seen.completed.map((file) => file.key)).toEqual([key]);
  });

  it("also over a restart, and starts again from 0 when the sender does", async () => {
    const first = await aService();
    await postJson(`${first.url}/faults`, { kind: "cut-mid-file", times: 1 });
    const { url, key } = await presign(first.app.url, aPhoto());
    await expect(send(url, aPhoto())).rejects.toThrow();
    await first.close();
    await aService({ folder: first.folder, port: first.port });
    expect((await fetch(url, { method: "HEAD" })).headers.get("x-ut-range-start")).toBe("150000");
    expect(existsSync(join(first.folder, "partial", key))).toBe(true);
    expect((await put(url, aPhoto(), 0)).status).toBe(200);
  });

  it("a sender that lost the last answer gets it again; nothing can be put in the place of a whole file", async () => {
    const { app } = await aService();
    const { url } = await presign(app.url, aPhoto());
    expect((await send(url, aPhoto())).status).toBe(200);
    expect(await (await send(url, aPhoto())).json()).toMatchObject({ serverData: { stored: "photo.jpg" } });
    expect((await put(url, aPhoto(), 0)).status).toBe(409);
    expect((await put(url, aPhoto(), 300_001)).status).toBe(416);
  });
});

describe("the file host", () => {
  it("opens a private file only to a signed address in time", async () => {
    const { app, utapi, url: serviceUrl } = await aService();
    const { url, key } = await presign(app.url, aPhoto());
    const { ufsUrl } = await (await send(url, aPhoto())).json();
    expect((await fetch(ufsUrl)).status).toBe(403);
    const signed = await utapi.generateSignedURL(key, { expiresIn: "1 minute" });
    const answer = await fetch(signed.ufsUrl);
    expect(answer.status).toBe(200);
    expect(answer.headers.get("content-type")).toBe("image/jpeg");
    expect(await bytesOf(answer)).toEqual(await bytesOf(aPhoto()));
    expect((await fetch(signed.ufsUrl.replace(key, "k".repeat(48)))).status).toBe(404);
    expect((await fetch(signed.ufsUrl.replace(/expires=\d/, "expires=9"))).status).toBe(403);
    expect((await fetch(`${signed.ufsUrl}0`)).status).toBe(403);
    expect((await fetch((await utapi.generateSignedURL(key, { expiresIn: -1 })).ufsUrl)).status).toBe(403);
    expect((await fetch(`${serviceUrl}/f/${key}`)).status).toBe(403);
  });

  it("finds a file by its own id and gives parts of it", async () => {
    const { app, utapi } = await aService();
    const photo = aPhoto(1000, "id=own7.jpg");
    await send((await presign(app.url, photo)).url, photo, photo.name);
    const signed = await utapi.generateSignedURL("own7");
    const part = await fetch(signed.ufsUrl, { headers: { range: "bytes=10-19" } });
    expect(part.status).toBe(206);
    expect(part.headers.get("content-range")).toBe("bytes 10-19/1000");
    expect(await bytesOf(part)).toEqual((await bytesOf(photo)).subarray(10, 20));
    expect((await fetch(signed.ufsUrl, { headers: { range: "bytes=1000-" } })).status).toBe(416);
    expect((await fetch((await utapi.getSignedURL("own7", { keyType: "customId", expiresIn: 60 })).ufsUrl)).status).toBe(200);
  });
});

describe("the calls of the server library", () => {
  it("uploads, lists, renames, opens, counts and deletes", async () => {
    const { utapi } = await aService();
    const { data } = await utapi.uploadFiles(new UTFile(["tow card"], "card.txt", { customId: "card" }));
    expect(data).toMatchObject({ name: "card.txt", customId: "card", size: 8 });
    const key = data?.key ?? "";
    await utapi.renameFiles({ fileKey: key, newName: "tow-card.txt" });
    expect((await utapi.listFiles()).files).toMatchObject([{ key, name: "tow-card.txt", customId: "card", status: "Uploaded" }]);
    expect((await fetch(data?.ufsUrl ?? "")).status).toBe(200);
    await utapi.updateACL(key, "private");
    expect((await fetch(data?.ufsUrl ?? "")).status).toBe(403);
    expect(await utapi.getUsageInfo()).toMatchObject({ totalBytes: 8, filesUploaded: 1 });
    expect(await utapi.deleteFiles([key, "unknown"])).toMatchObject({ success: true, deletedCount: 1 });
    expect((await fetch((await utapi.generateSignedURL(key)).ufsUrl)).status).toBe(404);
  });

  it("pages through a list", async () => {
    const { utapi } = await aService();
    for (const name of ["a.txt", "b.txt", "c.txt"]) await utapi.uploadFiles(new UTFile([name], name));
    expect(await utapi.listFiles({ limit: 2 })).toMatchObject({ hasMore: true });
    expect((await utapi.listFiles({ limit: 2, offset: 2 })).files).toHaveLength(1);
  });

  it("needs the key of the application", async () => {
    const { url } = await aService();
    for (const path of ["/v6/listFiles", "/route-metadata", "/callback-result"]) {
      expect((await postJson(`${url}${path}`, {})).status).toBe(401);
    }
    const headers = { "content-type": "application/json", "x-uploadthing-api-key": API_KEY };
    expect((await fetch(`${url}/v6/unknown`, { method: "POST", headers, body: "{}" })).status).toBe(404);
  });

  it("still has everything after a restart", async () => {
    const first = await aService();
    const { data } = await first.utapi.uploadFiles(new UTFile(["tow card"], "card.txt"), { acl: "private" });
    await first.close();
    const second = await aService({ folder: first.folder });
    expect(await (await fetch((await second.utapi.generateSignedURL(data?.key ?? "")).ufsUrl)).text()).toBe("tow card");
  });
});

describe("faults on order", () => {
  it("callback-never: the page is told that all is well, the application is not told", async () => {
    const { app, url: serviceUrl, utapi } = await aService();
    await postJson(`${serviceUrl}/faults`, { kind: "callback-never", times: 1 });
    const { url, key } = await presign(app.url, aPhoto());
    expect(await (await send(url, aPhoto())).json()).toMatchObject({ serverData: null });
    expect(app.seen.completed).toEqual([]);
    expect((await utapi.listFiles()).files.map((file) => file.key)).toEqual([key]);
  });

  it("callback-late and callback-twice", async () => {
    const { app, url: serviceUrl } = await aService();
    await postJson(`${serviceUrl}/faults`, { kind: "callback-late", ms: 150, times: 1 });
    await postJson(`${serviceUrl}/faults`, { kind: "callback-twice", times: 1 });
    const { url } = await presign(app.url, aPhoto());
    expect(await (await send(url, aPhoto())).json()).toMatchObject({ serverData: null });
    expect(app.seen.completed).toEqual([]);
    await until(() => app.seen.completed.length === 2);
  });

  it("down and slow", async () => {
    const { app, url: serviceUrl, utapi } = await aService();
    const { url } = await presign(app.url, aPhoto());
    await until(async () => (await (await fetch(`${serviceUrl}/faults`)).json()).faults);
    await postJson(`${serviceUrl}/faults`, { kind: "down", times: 1 });
    const refused = await put(url, aPhoto());
    expect([refused.status, refused.headers.get("access-control-allow-origin")]).toEqual([503, "*"]);
    await postJson(`${serviceUrl}/faults`, { kind: "down" });
    await expect(utapi.listFiles()).rejects.toThrow();
    await postJson(`${serviceUrl}/faults`, { kind: "off" });
    await postJson(`${serviceUrl}/faults`, { kind: "slow", ms: 200, times: 1 });
    const start = Date.now();
    expect((await put(url, aPhoto())).status).toBe(200);
    expect(Date.now() - start).toBeGreaterThanOrEqual(190);
  });
});
