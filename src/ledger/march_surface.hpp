#pragma once

#include <variant>

#include "ledger/march.hpp"
#include "ledger/phi_index.hpp"

// Picks a surface's law once and marches it.
namespace rainledger {

/// Whichever march the surface's losses ask for. A phi index marches as the constant rate it was
/// matched to.
template <class Recorder>
void march_surface(const Surface& surface, const ConstantRate& matched_phi, const Hyetograph& rain,
                   const MarchInput& input, Recorder& recorder) {
    std::visit(
        [&]<class Law>(const Law& law) {
            if constexpr (std::is_same_v<Law, CurveNumber>) {
                CurveNumberMarch<Recorder>(retention_curve(law), input, recorder).run(rain);
            } else if constexpr (std::is_same_v<Law, PhiIndex>) {
                March<ConstantRate, Recorder>(matched_phi, surface, input, recorder).run(rain);
            } else {
                March<Law, Recorder>(law, surface, input, recorder).run(rain);
            }
        },
        surface.losses);
}

}  // namespace rainledger
