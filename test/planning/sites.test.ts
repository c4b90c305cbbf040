import { describe, expect, test } from "vitest";
import { siteFromText, sitesFromJson } from "../../src/planning/site-from.ts";

describe("siteFromText", () => {
  test("reads latitude, east longitude and height, the height being 0 where it is left out", () => {
    expect(siteFromText("46.5,8.0,2100")).toEqual({ latitudeDeg: 46.5, longitudeDeg: 8, heightM: 2100 });
    expect(siteFromText("-33.9, 18.5")).toEqual({ latitudeDeg: -33.9, longitudeDeg: 18.5, heightM: 0 });
    expect(siteFromText("+90,-180,-430")).toEqual({ latitudeDeg: 90, longitudeDeg: -180, heightM: -430 });
  });

  test.each([
    ["91,0,0", /the latitude 91 is not within -90 and 90 degrees/],
    ["139.7,35.6,40", /did you mean 35\.6,139\.7\?/],
    ["10,999", /longitude 999 is not within/],
    ["10,10,-9000", /height -9000/],
    ["", /is not latitude,longitude,height/],
    ["46.5", /is not latitude,longitude,height/],
    ["46.5;8", /is not latitude,longitude,height/],
    ["46.5N,8E", /is not latitude,longitude,height/],
    ["1,2,3,4", /is not latitude,longitude,height/],
    ["NaN,2", /is not latitude,longitude,height/],
  ])("refuses %j in one line that says what would be right", (text, message) => {
    expect(() => siteFromText(text)).toThrow(message);
    try {
      siteFromText(text);
    } catch (error) {
      expect((error as Error).message).not.toContain("\n");
    }
  });
});

describe("sitesFromJson", () => {
  const north = { name: "North Ridge", latitude: 69.6, longitude: 18.9, height: 20, zone: "Europe/Oslo" };

  test("reads a list, or an object that holds one, with or without a byte-order mark", () => {
    const sites = [{ name: "North Ridge", latitudeDeg: 69.6, longitudeDeg: 18.9, heightM: 20, zone: "Europe/Oslo" }];
    expect(sitesFromJson(JSON.stringify([north]), "f")).toEqual(sites);
    expect(sitesFromJson(`\uFEFF${JSON.stringify({ sites: [north] })}`, "f")).toEqual(sites);
    const { height: _, zone: __, ...least } = north;
    expect(sitesFromJson(JSON.stringify([least]), "f")[0]).toMatchObject({ heightM: 0 });
  });

  test.each([
    ["[", /^f: it is not JSON/],
    ["[]", /^f: give a list of sites/],
    ["{}", /^f: give a list of sites/],
    ["[3]", /site 1 is not an object/],
    [JSON.stringify([{ ...north, name: "" }]), /site 1 has no name/],
    [JSON.stringify([north, north]), /two sites are called "North Ridge"/],
    [JSON.stringify([{ ...north, latitude: 91 }]), /site 1 \("North Ridge"\): the latitude 91/],
    [JSON.stringify([{ ...north, latitude: "69" }]), /needs latitude and longitude in degrees/],
    [
      JSON.stringify([{ ...north, zone: "Europe/Olso" }]),
      /site 1 .*There is no zone "Europe\/Olso"; did you mean "Europe\/Oslo"/,
    ],
    [JSON.stringify([{ ...north, lattitude: 1 }]), /unknown field "lattitude"; did you mean "latitude"\?/],
  ])("refuses %s in one line", (text, message) => {
    expect(() => sitesFromJson(text, "f")).toThrow(message);
    try {
      sitesFromJson(text, "f");
    } catch (error) {
      expect((error as Error).message).not.toContain("\n");
    }
  });
});
