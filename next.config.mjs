/**
 * A worker obeys the Content-Security-Policy of its own script's answer, and the proxy that
 * sets the page policy does not see /_next/static. So the policy of worker scripts is set here.
 */
const workerPolicy = "default-src 'none'; script-src 'self'; connect-src 'self'; base-uri 'none'";

const securityHeaders = [
  { key: "X-Content-Type-Options", value: "nosniff" },
  { key: "Referrer-Policy", value: "same-origin" },
  { key: "X-Frame-Options", value: "DENY" },
  { key: "Permissions-Policy", value: "camera=(self), geolocation=(self), microphone=()" },
];

const production = process.env.NODE_ENV === "production";

/** @type {import('next').NextConfig} */
export default {
  // A test build must not overwrite the build that is being served.
  distDir: process.env.FERRULE_DIST_DIR || ".next",
  poweredByHeader: false,
  reactStrictMode: true,
  // Sequelize loads its parts by name at run time and must not be bundled; pg comes with it.
  serverExternalPackages: ["sequelize", "pg"],
  // The address used in development is 127.0.0.1, which Next does not count as its own host.
  allowedDevOrigins: ["127.0.0.1", "localhost"],
  turbopack: { root: import.meta.dirname },
  async headers() {
    return [
      { source: "/:path*", headers: securityHeaders },
      // Development chunks are evaluated for hot reload, which this policy would forbid.
      ...(production
        ? [{ source: "/_next/static/chunks/:path*", headers: [{ key: "Content-Security-Policy", value: workerPolicy }] }]
        : []),
    ];
  },
};
