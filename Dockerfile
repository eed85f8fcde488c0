# syntax=docker/dockerfile:1

FROM node:20-bookworm-slim AS build
# The database driver is compiled where no prebuilt binary can be had.
RUN apt-get update && apt-get install -y --no-install-recommends python3 make g++ && rm -rf /var/lib/apt/lists/*
WORKDIR /app
COPY package.json package-lock.json tsconfig.json ./
COPY src ./src
RUN npm ci && npm prune --omit=dev --ignore-scripts

FROM node:20-bookworm-slim
ENV NODE_ENV=production
WORKDIR /app
COPY --from=build --chown=node:node /app/package.json ./
COPY --from=build --chown=node:node /app/node_modules ./node_modules
COPY --from=build --chown=node:node /app/dist ./dist
COPY --chown=node:node config ./config
# The heartbeat that the health check reads is written here.
RUN mkdir .leadsman && chown node:node .leadsman
VOLUME /app/.leadsman
USER node
HEALTHCHECK --interval=30s --timeout=5s --start-period=10s CMD ["node", "dist/start/health.js"]
# In an image nobody sits at a terminal: without the workspace's tokens this refuses to start and names them.
CMD ["node", "dist/start/serve.js", "--workspace", "slack"]
