#include <string>
#include <utility>

#include "chart/ledger_strips.hpp"
#include "chart/page.hpp"
#include "chart/stacked_labels.hpp"

namespace rainledger {
namespace {

/// The accounts as they stand at the end of a drawn step, summed from the axis up.
struct Standing {
    double infiltrated = 0.0;
    double with_initial = 0.0;
    double with_ponded = 0.0;
    double all = 0.0;
};

std::vector<Standing> standings(const LedgerStrips& strips) {
    std::vector<Standing> out{{}};
    Accounts sum;
    std::size_t next = 0;
    for (const DrawnStep& step : strips.drawn) {
        for (; next <= step.last; ++next) {
            const Accounts& row = strips.view.rows[next].accounts;
            sum.infiltrated_mm += row.infiltrated_mm;
            sum.initial_loss_mm += row.initial_loss_mm;
            sum.excess_mm += row.excess_mm;
            sum.ponded_mm = row.ponded_mm;
        }
        Standing at;
        at.infiltrated = strips.units.shown(sum.infiltrated_mm);
        at.with_initial = at.infiltrated + strips.units.shown(sum.initial_loss_mm);
        at.with_ponded = at.with_initial + strips.units.shown(sum.ponded_mm);
        at.all = at.with_ponded + strips.units.shown(sum.excess_mm);
        out.push_back(at);
    }
    return out;
}

template <class Low, class High>
Layer account_area(const LedgerStrips& strips, const std::vector<Standing>& at, const Low& low,
                   const High& high, std::string_view colour) {
    std::vector<Span> spans;
    for (std::size_t i = 0; i < at.size(); ++i) {
        const double hours = i == 0 ? 0.0 : strips.drawn[i - 1].to_h;
        spans.push_back({hours, low(at[i]), high(at[i])});
    }
    return area(spans, colour);
}

/// Labels beside the bands in which the accounts end.
void account_labels(Drawing& drawing, const Box& box, const LedgerStrips& strips,
                    const Standing& end, double top) {
    const Accounts& total = strips.view.total;
    const double per_unit = (box.top - box.bottom) / top;
    std::vector<StackedLabel> labels;
    const auto band = [&](double low, double high, double mm, std::string_view name,
                          std::string_view colour) {
        if (mm <= 0.0) return;
        labels.push_back({box.bottom + (low + high) / 2.0 * per_unit,
                          std::string(name) + " " + strips.units.depth_words(mm), colour});
    };
    band(0.0, end.infiltrated, total.infiltrated_mm, "infiltrated", kInfiltrated);
    band(end.infiltrated, end.with_initial, total.initial_loss_mm, "initial loss", kInitialLoss);
    band(end.with_initial, end.with_ponded, total.ponded_mm, "ponded", kPonded);
    band(end.with_ponded, end.all, total.excess_mm, "excess", kExcess);
    spread(labels, box.bottom + 6.0, box.top - 6.0, 15.0);
    for (const StackedLabel& label : labels)
        key_swatch(drawing, label.y, label.colour, label.words);
}

}  // namespace

void add_accounts_strip(Drawing& drawing, const Box& box, const LedgerStrips& strips) {
    const std::vector<Standing> at = standings(strips);
    Panel panel;
    panel.box = box;
    panel.x = {0.0, strips.time.span_h, strips.time.ticks};
    panel.y = scale_axis(at.back().all, 4);
    const double top = panel.y.to;
    const auto axis = [](const Standing& /*s*/) { return 0.0; };
    const auto infiltrated = [](const Standing& s) { return s.infiltrated; };
    const auto with_initial = [](const Standing& s) { return s.with_initial; };
    const auto with_ponded = [](const Standing& s) { return s.with_ponded; };
    const auto all = [](const Standing& s) { return s.all; };
    panel.layers = {account_area(strips, at, axis, infiltrated, kInfiltrated),
                    account_area(strips, at, infiltrated, with_initial, kInitialLoss),
                    account_area(strips, at, with_initial, with_ponded, kPonded),
                    account_area(strips, at, with_ponded, all, kExcess)};
    drawing.panel(std::move(panel));
    const bool run_on = strips.view.total.run_on_mm > 0.0;
    const Accounts& total = strips.view.total;
    strip_title(drawing, box, run_on ? "rain and run-on so far" : "rain so far",
                strips.units.depth_unit());
    drawing.text(
        box.right, box.top + kStripTitleRise,
        (run_on ? "in all " : "rain ") + strips.units.depth_words(total.rain_mm + total.run_on_mm),
        {kQuiet, kTextSize, false, Align::right});
    account_labels(drawing, box, strips, at.back(), top);
    time_title(drawing, box, strips.time);
}

}  // namespace rainledger
