# The service alone: built with everything, shipped with what it runs on.
ARG NODE_IMAGE=node:24-slim

FROM ${NODE_IMAGE} AS build
WORKDIR /app
COPY package.json package-lock.json .npmrc ./
COPY sdk/package.json sdk/package.json
RUN npm ci --ignore-scripts
COPY tsconfig.json tsconfig.build.json tsconfig.service.json ./
COPY service service
RUN npx tsc -p tsconfig.service.json

FROM ${NODE_IMAGE} AS dependencies
WORKDIR /app
COPY package.json package-lock.json .npmrc ./
COPY sdk/package.json sdk/package.json
RUN npm ci --omit=dev --ignore-scripts --workspaces=false

FROM ${NODE_IMAGE}
ENV NODE_ENV=production HOST=0.0.0.0 PORT=8080
WORKDIR /app
COPY --from=dependencies /app/node_modules node_modules
COPY --from=build /app/dist dist
COPY package.json ./
USER 1000:1000
EXPOSE 8080
HEALTHCHECK --interval=10s --timeout=2s --start-period=10s --retries=3 \
  CMD ["node", "-e", "fetch(`http://127.0.0.1:${process.env.PORT}/health/ready`).then((answer) => process.exit(answer.ok ? 0 : 1), () => process.exit(1))"]
# Not through a shell or npm: the stop signal must reach the service itself.
CMD ["node", "dist/service/main.js"]
