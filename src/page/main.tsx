import { render } from 'preact'
import { Engine } from './engine/engine.js'
import { App } from './view/App.js'
import { EngineContext } from './view/useWriter.js'

const root = document.querySelector('#page')
if (root !== null) {
  const engine = new Engine()
  render(
    <EngineContext.Provider value={engine}>
      <App engine={engine} />
    </EngineContext.Provider>,
    root,
  )
}
