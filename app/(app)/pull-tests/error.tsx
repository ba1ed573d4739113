"use client";

export { default } from "../trips/error";
