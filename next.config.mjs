/** @type {import("next").NextConfig} */
const config = {
  serverExternalPackages: ["sequelize", "sqlite3", "@node-rs/argon2", "pdf-lib", "@pdf-lib/fontkit"],
  poweredByHeader: false,
  async headers() {
    return [
      {
        source: "/:path*",
        headers: [
          { key: "X-Content-Type-Options", value: "nosniff" },
          { key: "Referrer-Policy", value: "same-origin" },
          { key: "X-Frame-Options", value: "SAMEORIGIN" },
        ],
      },
    ];
  },
};

export default config;
