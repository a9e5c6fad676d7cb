/** The live half of the server in a process of its own, which a test may kill. */
import { connect } from '@/db/connect'
import { startLiveServer } from './live-server'

const [url, port] = [process.env.CHILD_DATABASE_URL as string, Number(process.env.CHILD_PORT)]
void startLiveServer(connect(url), { port }).then(() => process.send?.('ready'))
process.on('disconnect', () => process.exit(0))
