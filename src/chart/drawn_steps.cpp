#include "chart/drawn_steps.hpp"

#include <cmath>

namespace rainledger {

std::vector<DrawnStep> drawn_steps(const Hyetograph& rain, std::size_t steps,
                                   std::span<const double> weight, std::size_t most) {
    const double first = rain.edges_h.front();
    const double part_h = (rain.edges_h[steps] - first) / static_cast<double>(most);
    std::vector<DrawnStep> out;
    double part = -1.0;
    for (std::size_t step = 0; step < steps; ++step) {
        const double from = rain.edges_h[step] - first;
        const double to = rain.edges_h[step + 1] - first;
        const double own_part = std::floor(from / part_h);
        if (steps <= most || own_part > part) {
            part = own_part;
            out.push_back({from, to, step, step});
            continue;
        }
        DrawnStep& drawn = out.back();
        drawn.to_h = to;
        drawn.last = step;
        if (weight[step] > weight[drawn.step]) drawn.step = step;
    }
    return out;
}

}  // namespace rainledger
