cd /work/main/apps/web && npx vite build --outDir /tmp/store-dist --emptyOutDir > /tmp/store-build.log 2>&1 || tail -20 /tmp/store-build.log
cd /work/main && npx tsx apps/web/.scratch-store/shots.mts "$@"
