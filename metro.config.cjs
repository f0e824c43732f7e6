const path = require('node:path');

const { getDefaultConfig } = require('expo/metro-config');

const config = getDefaultConfig(__dirname);
// The switch is written into the bundle: without it in the cache's key, a build with the parts sheet closed would take
// the open one from the cache.
config.cacheVersion = `parts:${process.env.EXPO_PUBLIC_PARTS ?? ''}`;

const zodLocales = path.resolve(__dirname, 'shared/ui/theme/stubs/zodLocales.js');
const paperIcon = path.resolve(__dirname, 'shared/ui/theme/PaperIcon.tsx');

const drawn = {
  'd3-scale': path.resolve(__dirname, 'shared/ui/theme/stubs/d3Scale.js'),
  'd3-shape': path.resolve(__dirname, 'shared/ui/theme/stubs/d3Shape.js'),
};

config.resolver.resolveRequest = (context, moduleName, platform) => {
  // zod re-exports every language as a namespace; only English is used, and the rest is 40 KB gzipped
  if (moduleName === '../locales/index.js' && /[\\/]zod[\\/]v4[\\/]/.test(context.originModulePath)) {
    return { type: 'sourceFile', filePath: zodLocales };
  }
  // Paper asks for an icon font by this name; it gets our own drawn icons and ships no font
  if (moduleName === '@react-native-vector-icons/material-design-icons') {
    return { type: 'sourceFile', filePath: paperIcon };
  }
  // by file: their packages name no sub-path, and nothing here shakes the rest of them off
  if (moduleName in drawn) return { type: 'sourceFile', filePath: drawn[moduleName] };
  return context.resolveRequest(context, moduleName, platform);
};

module.exports = config;
