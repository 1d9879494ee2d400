import { Refusal } from "../http";

/** What the application promised about a file when it signed the upload address. */
export type Presigned = {
  appId: string;
  name: string;
  size: number;
  type: string;
  slug: string | null;
  customId: string | null;
  acl: "private" | "public-read";
  disposition: string;
};

/** Reads the promised values; the client library encodes each of them once more than the address itself does. */
export function readPresigned(url: URL): Presigned {
  const read = (name: string) => {
    const value = url.searchParams.get(`x-ut-${name}`);
    return value === null ? null : decodeURIComponent(value);
  };
  const size = Number(read("file-size") ?? "");
  const name = read("file-name");
  if (!name || !Number.isSafeInteger(size) || size < 0) throw new Refusal(400, "Missing file name or size");
  const acl = read("acl") ?? "public-read";
  if (acl !== "private" && acl !== "public-read") throw new Refusal(400, "Invalid acl");
  return {
    appId: read("identifier") ?? "",
    name,
    size,
    type: read("file-type") ?? "",
    slug: read("slug"),
    customId: read("custom-id"),
    acl,
    disposition: read("content-disposition") === "attachment" ? "attachment" : "inline",
  };
}

/** Null when the sent type is the promised one, or when the sender names none (the rest of a cut file never carries its type). */
export function faultOfType(presigned: Presigned, sentType: string): string | null {
  const sent = bare(sentType);
  const promised = bare(presigned.type);
  if (sent === "" || sent === "application/octet-stream" || !promised.includes("/")) return null;
  return sent === promised ? null : `File type ${sent} is not the signed ${promised}`;
}

const bare = (type: string) => (type.split(";")[0] ?? "").trim().toLowerCase();
