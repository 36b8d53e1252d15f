/** Every address inside the product is built here, for pages and for the API. */
const enc = encodeURIComponent;
const rigPath = (rigId: string) => `/rigs/${enc(rigId)}`;
const apiRig = (rigId: string) => `/api/v1${rigPath(rigId)}`;

export const paths = {
  home: () => "/",
  signIn: (returnTo?: string) => (returnTo ? `/sign-in?from=${enc(returnTo)}` : "/sign-in"),
  signUp: () => "/sign-up",
  account: () => "/account",
  help: () => "/help/sources",
  connectionTool: () => "/tools/connection",
  conditionerTool: () => "/tools/conditioner",
  rigs: () => "/rigs",
  rig: rigPath,
  gearList: (rigId: string) => `${rigPath(rigId)}/gear`,
  newGear: (rigId: string, kind?: string, variant?: string) =>
    `${rigPath(rigId)}/gear/new${kind ? `?kind=${enc(kind)}${variant ? `&variant=${enc(variant)}` : ""}` : ""}`,
  gear: (rigId: string, gearId: string) => `${rigPath(rigId)}/gear/${enc(gearId)}`,
  editGear: (rigId: string, gearId: string) => `${rigPath(rigId)}/gear/${enc(gearId)}?edit=1`,
  savedGear: (rigId: string, gearId: string, revision: number) => `${rigPath(rigId)}/gear/${enc(gearId)}?saved=${revision}`,
  songs: (rigId: string) => `${rigPath(rigId)}/songs`,
  board: (rigId: string, songId: string) => `${rigPath(rigId)}/songs/${enc(songId)}`,
  sheet: (rigId: string, songId: string, paper: "a4" | "letter" = "a4") =>
    `${rigPath(rigId)}/songs/${enc(songId)}/sheet${paper === "letter" ? "?paper=letter" : ""}`,
  set: (rigId: string, setId: string) => `${rigPath(rigId)}/sets/${enc(setId)}`,
  people: (rigId: string) => `${rigPath(rigId)}/people`,
  api: {
    openapi: () => "/api/v1/openapi.json",
    connection: () => "/api/v1/connection",
    conditioner: () => "/api/v1/conditioner",
    accounts: () => "/api/v1/accounts",
    rigs: () => "/api/v1/rigs",
    rig: apiRig,
    members: (rigId: string) => `${apiRig(rigId)}/members`,
    gearList: (rigId: string) => `${apiRig(rigId)}/gear`,
    gear: (rigId: string, gearId: string) => `${apiRig(rigId)}/gear/${enc(gearId)}`,
    copyGear: (rigId: string, gearId: string) => `${apiRig(rigId)}/gear/${enc(gearId)}/copy`,
    retireGear: (rigId: string, gearId: string) => `${apiRig(rigId)}/gear/${enc(gearId)}/retire`,
    songs: (rigId: string) => `${apiRig(rigId)}/songs`,
    song: (rigId: string, songId: string) => `${apiRig(rigId)}/songs/${enc(songId)}`,
    patch: (rigId: string, songId: string) => `${apiRig(rigId)}/songs/${enc(songId)}/patch`,
    check: (rigId: string, songId: string) => `${apiRig(rigId)}/songs/${enc(songId)}/check`,
    sheetPdf: (rigId: string, songId: string, paper: "a4" | "letter" = "a4") =>
      `${apiRig(rigId)}/songs/${enc(songId)}/sheet.pdf${paper === "letter" ? "?paper=letter" : ""}`,
    sets: (rigId: string) => `${apiRig(rigId)}/sets`,
    set: (rigId: string, setId: string) => `${apiRig(rigId)}/sets/${enc(setId)}`,
  },
} as const;
