import { query, route } from "@/app/_server/handle";
import { takeUpload } from "@/app/_server/import-files";
import { listImports } from "@/modules/imports";

export const GET = query(listImports);
export const POST = route(takeUpload);
