/**
 * An application of the framework with nothing in it: an empty page, and a route that echoes JSON. It
 * is built in a throw-away folder, whose node_modules is a link to those of the checkout; a root above
 * both lets the build follow it. Inside the checkout it would be given parts of the portal.
 * @type {import("next").NextConfig}
 */
const nextConfig = { turbopack: { root: "/" }, outputFileTracingRoot: "/" };

export default nextConfig;
