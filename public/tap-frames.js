/* Runs in the browser's sound thread, where nothing can be imported: gathers the microphone's frames and sends them on. */
const GATHERED = 1024

class TapFrames extends AudioWorkletProcessor {
  constructor() {
    super()
    this.frames = new Float32Array(GATHERED)
    this.count = 0
    this.to = null
    this.port.onmessage = ({ data }) => {
      this.to = data
    }
  }

  process([input]) {
    const channel = input[0]
    if (channel === undefined || this.to === null) return true
    for (const value of channel) {
      this.frames[this.count++] = value
      if (this.count === GATHERED) {
        this.to.postMessage(this.frames, [this.frames.buffer])
        this.frames = new Float32Array(GATHERED)
        this.count = 0
      }
    }
    return true
  }
}

registerProcessor('tap-frames', TapFrames)
