#include "chart/fit_view.hpp"

#include <algorithm>
#include <cmath>

#include <fmt/core.h>

#include "chart/storm_view.hpp"
#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

std::vector<const LawFit*> ranked_laws(const FieldFit& fit) {
    const auto& laws = fit.pooled ? fit.pooled->laws : fit.pits.front().laws;
    const auto& ranking = fit.pooled ? fit.pooled->ranking : fit.pits.front().ranking;
    std::vector<const LawFit*> out;
    out.reserve(ranking.size());
    for (const RankedLaw& ranked : ranking)
        out.push_back(&*laws[ranked.index].fit);
    return out;
}

/// The readings of all pits, in the order of the best law's.
std::vector<FitMark> marks_of(const FieldFit& fit, const std::vector<const LawFit*>& laws) {
    std::vector<FitMark> marks;
    for (std::size_t pit = 0; pit < fit.pits.size(); ++pit) {
        const InfiltrationTest& test = fit.pits[pit].test;
        const double before_mm =
            laws.empty() ? 0.0 : curve_depth_mm(laws.front()->curve, test.from_h);
        for (const TestReading& reading : test.readings) {
            FitMark mark{pit,           reading.start_h,       reading.middle_h,
                         reading.end_h, reading.rate_mm_per_h, before_mm + reading.depth_mm};
            if (!laws.empty()) mark.residual_mm = laws.front()->readings[marks.size()].residual_mm;
            marks.push_back(mark);
        }
    }
    return marks;
}

/// The readings, and of curves above them no more than a little.
double rates_top(const FitView& view) {
    constexpr double kRoomForCurves = 1.2;
    double most = 0.0;
    for (const FitMark& mark : view.marks)
        most = std::max(most, mark.rate_mm_per_h);
    double curves = 0.0;
    for (const LawFit* law : view.laws)
        for (const CurvePoint& point : law->curve)
            if (point.time_h > 0.0) curves = std::max(curves, point.rate_mm_per_h);
    return std::clamp(curves, most, kRoomForCurves * most);
}

double depths_top(const FitView& view) {
    double most = 0.0;
    for (const FitMark& mark : view.marks)
        most = std::max(most, mark.depth_mm);
    for (const LawFit* law : view.laws)
        most = std::max(most, law->curve.back().depth_mm);
    return most;
}

/// With several pits only the best law's residuals are drawn.
double residuals_top(const FitView& view) {
    double most = 0.0;
    for (const LawFit* law : view.laws) {
        for (const FittedReading& reading : law->readings)
            most = std::max(most, std::abs(reading.residual_mm));
        if (view.pits.size() > 1) break;
    }
    return most;
}

std::string words_of(const FitView& view, const ChartUnits& units) {
    std::string out = fmt::format("{} readings", view.marks.size());
    if (view.pits.size() > 1) out += fmt::format(" in {} pits", view.pits.size());
    out += " over " + span_words(view.time.span_h);
    if (!view.laws.empty())
        out += fmt::format("; {} ranks first by AICc, {}", field_law_name(view.laws.front()->law),
                           error_words(*view.laws.front(), units));
    return out;
}

std::string rates_words(double design_factor) {
    if (!(design_factor > 1.0)) return "rate";
    return fmt::format("rate as read, not divided by {:g} for design", design_factor);
}

}  // namespace

FitView fit_view(const ShownFit& shown, const ChartUnits& units, int most_ticks) {
    FitView view;
    view.laws = ranked_laws(shown.fit);
    view.marks = marks_of(shown.fit, view.laws);
    double last_h = 0.0;
    for (const TestFit& pit : shown.fit.pits) {
        view.pits.push_back(pit.test.pit);
        last_h = std::max(last_h, pit.test.readings.back().end_h);
    }
    view.time = time_axis(make_hyetograph({0.0, last_h}, "h", {0.0}), most_ticks);
    view.rates_top = rates_top(view);
    view.depths_top = depths_top(view);
    view.residuals_top = residuals_top(view);
    view.words = words_of(view, units);
    view.rates_words = rates_words(shown.fit.options.design_factor);
    return view;
}

std::string error_words(const LawFit& fit, const ChartUnits& units) {
    const bool metric = units.depth_unit() == "mm";
    return fmt::format("RMSE {} {}", fixed(units.shown(fit.rmse_mm), metric ? 2 : 3),
                       units.depth_unit());
}

}  // namespace rainledger
