import { describe, expect, test } from "vitest";
import { isPublicAddress } from "#app/integrations/webhook/public-address.ts";
import { liesIn, networkList, plainAddress } from "#app/server/networks.server.ts";

const hostOf = (address: string) => new URL(address).hostname.replace(/^\[|\]$/g, "");

describe("an address that webhooks do not go to", () => {
  test.each([
    ["this machine", "127.0.0.1 127.8.9.10 ::1 0.0.0.0 ::"],
    ["private networks", "10.0.0.1 172.16.0.1 172.31.255.254 192.168.1.1 100.64.0.1"],
    ["link-local, with the metadata of clouds", "169.254.169.254 169.254.0.1 fe80::1 fe80::1%eth0 168.63.129.16"],
    ["unique-local, with the metadata of clouds", "fc00::1 fd00:ec2::254"],
    ["multicast and broadcast", "224.0.0.1 239.255.255.250 255.255.255.255 ff02::1"],
    ["documentation and tests", "192.0.2.1 198.51.100.7 203.0.113.9 198.18.0.1 2001:db8::1 3fff::1"],
    ["IPv4 written as IPv6", "::ffff:127.0.0.1 ::ffff:7f00:1 ::FFFF:10.1.2.3 ::ffff:169.254.169.254"],
    ["IPv4 within IPv6", "64:ff9b::7f00:1 2002:7f00:1:: 2001:0:4136:e378:8000:63bf:3fff:fdd2 ::127.0.0.1"],
    ["none of anybody", "fec0::1 4000::1 240.0.0.1"],
    ["no address", "localhost 127.1 2130706433 0x7f000001"],
  ])("is one of %s", (_, addresses) => {
    expect(addresses.split(" ").filter(isPublicAddress)).toEqual([]);
  });

  test("is recognised however it is typed in a URL", () => {
    const typed = [
      "http://2130706433/",
      "http://0x7f.1/",
      "http://017700000001/",
      "http://127.1/",
      "http://[::ffff:127.0.0.1]/",
    ];
    expect(typed.map(hostOf).filter(isPublicAddress)).toEqual([]);
    expect(typed.map(hostOf).map(plainAddress)).toEqual(typed.map(() => "127.0.0.1"));
    expect(URL.canParse("http://[fe80::1%25eth0]/")).toBe(false);
  });
});

test("addresses of the public internet are public", () => {
  const hosts = ["1.1.1.1", "93.184.216.34", "172.32.0.1", "100.128.0.1", "2606:4700::1111", "2001:4860:4860::8888"];
  expect(hosts.filter((host) => !isPublicAddress(host))).toEqual([]);
  expect(isPublicAddress("::ffff:1.1.1.1")).toBe(true);
});

describe("a setting that names networks", () => {
  test("holds what lies in them, however it is written", () => {
    const named = networkList.parse(" 10.20.0.0/16, ::1 ,fd12::/32,");
    expect(
      ["10.20.255.1", "::ffff:10.20.0.1", "0:0:0:0:0:0:0:1", "fd12::5%eth0"].filter((a) => !liesIn(named, a)),
    ).toEqual([]);
    expect(["10.21.0.1", "::2", "fd13::5", "somewhere", ""].filter((a) => liesIn(named, a))).toEqual([]);
    expect(liesIn(networkList.parse(undefined), "127.0.0.1")).toBe(false);
  });

  test.each(["10.0.0.0/33", "::1/129", "everywhere", "10.0.0.0/8 10.1.0.0/8", "fe80::1%eth0", "10.0.0.0/"])(
    "refuses %s",
    (text) => {
      expect(networkList.safeParse(text).error?.issues[0]?.message).toMatch(/is no network/);
    },
  );
});
