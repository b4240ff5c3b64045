"use client";

// A page that fails keeps the top bar above it.
export { default } from "@/app/error";
