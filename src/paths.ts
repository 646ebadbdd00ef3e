/** Every address of the product, as a path below PUBLIC_URL. */
export const paths = {
  frontDoor: () => '/',
};
