declare module 'ioredis-mock' {
  import { Redis } from 'ioredis'
  export default Redis
}
