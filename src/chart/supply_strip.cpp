#include "chart/supply_strip.hpp"

#include <algorithm>

#include "chart/page.hpp"

namespace rainledger {

Panel supply_strip(const Box& box, const Axis& time, const Axis& down,
                   const std::vector<DrawnStep>& drawn, std::span<const StepRates> rates) {
    Panel panel;
    panel.box = box;
    panel.x = {time.from, time.to, {}, false};
    panel.y = {down.to, 0.0, down.ticks, down.labelled};
    const auto rain = [&](const DrawnStep& step) { return rates[step.step].rain; };
    const auto supply = [&](const DrawnStep& step) {
        return rates[step.step].rain + rates[step.step].run_on;
    };
    add_columns(panel, drawn, rain, kRain, kRainEdge);
    if (std::any_of(rates.begin(), rates.end(), [](const StepRates& r) { return r.run_on > 0.0; }))
        panel.layers.push_back(stepped_area(drawn, rain, supply, kRunOn));
    return panel;
}

double kept(const StepRates& rate) {
    return rate.infiltrated + rate.initial_loss + rate.stored;
}

double peak_supply(std::span<const StepRates> rates) {
    double peak = 0.0;
    for (const StepRates& rate : rates)
        peak = std::max(peak, rate.rain + rate.run_on);
    return peak;
}

}  // namespace rainledger
