export default { compress: false, poweredByHeader: false };
