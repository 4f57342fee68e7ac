export const Caution = () => (
  <p className="caution">
    Planning figures: rigid crank, steady speed, each main hinged to its neighbours. The maker’s data, the
    machine shop and a qualified person come first.
  </p>
)
