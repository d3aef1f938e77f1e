#!/bin/sh
# What `npm test` runs. Needs only sh, node and npm.
set -u
. server/launch/install.sh
exec node --import tsx tests/run.ts "$@"
