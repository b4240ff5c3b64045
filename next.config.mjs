/** @type {import("next").NextConfig} */
const nextConfig = {
  poweredByHeader: false,
  reactStrictMode: true,
  serverExternalPackages: ["pdfkit", "@node-rs/argon2", "sharp", "pino", "mysql2"],
};

export default nextConfig;
