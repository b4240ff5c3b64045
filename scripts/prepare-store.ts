import { env } from "@/lib/env";
import { objectStore } from "@/lib/storage/s3";

// Makes the bucket, and lets pages of the portal send their uploads straight to it.
await objectStore().prepare(new URL(env().NEXTAUTH_URL).origin);
