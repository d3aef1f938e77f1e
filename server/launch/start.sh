#!/bin/sh
# What `npm start` runs. Needs only sh, node and npm; ends as node itself, so that a signal reaches the server.
set -u
. server/launch/install.sh
exec node --import tsx server/launch/start.ts
