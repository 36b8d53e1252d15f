import { Validator } from "@seriousme/openapi-schema-validator";
import { describe, expect, it } from "vitest";
import { Client } from "./client";

describe("the API's own description", () => {
  it("is a valid OpenAPI 3.1 document", async () => {
    const response = await new Client().get("/api/v1/openapi.json");
    expect(response.headers.get("content-type")).toContain("application/json");
    const document = (await response.json()) as { openapi: string };
    expect(document.openapi).toMatch(/^3\.1\./);
    const result = await new Validator().validate(document);
    expect(result.errors ?? []).toEqual([]);
    expect(result.valid).toBe(true);
  });
});
