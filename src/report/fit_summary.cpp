#include <array>
#include <cstddef>

#include <fmt/core.h>

#include "rainledger/report/version.hpp"
#include "report/clock.hpp"
#include "report/fit_summary_parts.hpp"
#include "report/lookup_parts.hpp"

namespace rainledger {
namespace {

std::string_view kind_words(ReadingKind kind) {
    switch (kind) {
        case ReadingKind::infiltrated:
            return "cumulative depth";
        case ReadingKind::drop:
            return "drops of the water";
        case ReadingKind::volume_added:
            return "volumes added";
        case ReadingKind::water_level:
            break;
    }
    return "the water level";
}

std::string ignored_line(const TestFit& pit) {
    const std::size_t ignored = pit.ignored_readings;
    if (ignored == 0) return {};
    return fmt::format(
        "  without the first {}, as asked: depths count from {} min on\n",
        ignored == 1 ? std::string("reading") : std::to_string(ignored) + " readings",
        four_figures(60.0 * pit.test.from_h));
}

/// "10 readings of drops in 2 h 00 min: 84.2 mm infiltrated, at 31.0 mm/h in the end".
std::string test_lines(const TestFit& pit, const Display& display) {
    const auto& readings = pit.test.readings;
    const std::string words =
        fmt::format("{} reading{} of {} in {}: {} infiltrated, at {} {} in the end",
                    readings.size(), readings.size() == 1 ? "" : "s", kind_words(pit.test.kind),
                    duration_text(readings.back().end_h - pit.test.from_h),
                    display.depth_with_unit(readings.back().depth_mm),
                    display.rate(readings.back().rate_mm_per_h), display.rate_unit());
    return filled("  ", words, "      ", kFitWidth) + ignored_line(pit);
}

std::string warnings_part(const std::vector<FitWarning>& first,
                          const std::vector<FitWarning>& second) {
    std::string out;
    for (const auto* warnings : {&first, &second})
        for (const FitWarning& warning : *warnings)
            out += filled("  - ", printable(warning.text) + ".", "    ", kFitWidth);
    return out.empty() ? out : "\nWarnings\n" + out;
}

std::string one_pit(const TestFit& pit, const FieldFitOptions& options, const Display& display) {
    const RankedFits fits{pit.laws, pit.ranking};
    return test_lines(pit, display) + "\n" + readings_part(pit, display) + "\n" +
           steady_part(pit, options, display) + "\n" + laws_part(fits, options, display) +
           laws_notes(fits, options) + "\n" + lines_part(pit, display) + lines_notes({&pit, 1}) +
           warnings_part(pit.warnings, ranked_warnings(fits));
}

/// One of several: without the notes that stand with all of them, and with the warnings of its best
/// law alone.
std::string among_pits(const TestFit& pit, const FieldFitOptions& options, const Display& display) {
    std::vector<FitWarning> of_best;
    if (!pit.ranking.empty()) of_best = pit.laws[pit.ranking.front().index].fit->warnings;
    return "\nPit " + printable(pit.test.pit) + "\n" + test_lines(pit, display) + "\n" +
           readings_part(pit, display) + "\n" + steady_part(pit, options, display) + "\n" +
           laws_part({pit.laws, pit.ranking}, options, display) + "\n" + lines_part(pit, display) +
           warnings_part(pit.warnings, of_best);
}

std::string together(const FieldFit& fit, const Display& display) {
    const RankedFits fits = site_fits(fit);
    std::string out = fmt::format("\nAll pits together\n  {} readings in {} pits\n",
                                  reading_count(fit), fit.pits.size());
    const std::string alone = best_alone_words(fit);
    if (!alone.empty())
        out += filled("  ", "ranked first in the pits, each fitted alone: " + alone, "      ",
                      kFitWidth);
    return out + "\n" + laws_part(fits, fit.options, display) + laws_notes(fits, fit.options) +
           "\n" + spread_part(*fit.pooled, display) +
           warnings_part(fit.pooled->warnings, ranked_warnings(fits));
}

std::string several_pits(const FieldFit& fit, const Display& display) {
    std::string out = together(fit, display);
    for (const TestFit& pit : fit.pits)
        out += among_pits(pit, fit.options, display);
    return out + "\n" + lines_notes(fit.pits);
}

std::string sideways_words(bool single_ring) {
    if (single_ring)
        return "This test had a single ring: water spreads sideways below it, so that its rates "
               "are higher than those of water going straight down.";
    return "Water that spreads sideways below the ring makes rates too high, most below a single "
           "one.";
}

std::string allowance_words(double factor) {
    if (factor > 1.0)
        return "Rates for design are divided by " + four_figures(factor) +
               " as asked; whether that is enough for clogging, compaction and the spread of the "
               "soil is the engineer's to say.";
    return "No allowance is made for clogging, compaction or the spread of the soil: that is the "
           "engineer's.";
}

/// Cautions of field tests (common practice).
std::string cautions_part(const ShownFit& shown) {
    const std::array<std::string, 5> cautions{
        "The test describes a small area under ponded water; soils vary from pit to pit more than "
        "one pit tells.",
        sideways_words(shown.single_ring),
        "Digging and driving disturb the soil: smeared walls slow the water, gaps along the ring "
        "let it through.",
        "Warm water infiltrates faster, by 2 to 3 % for each degree Celsius: set rates of a warm "
        "day against the season of design.",
        allowance_words(shown.fit.options.design_factor)};
    std::string out = "\nBefore using these values\n";
    for (const std::string& caution : cautions)
        out += filled("  - ", caution, "    ", kFitWidth);
    return out;
}

}  // namespace

std::string fit_summary(const ShownFit& shown, const SummaryOptions& options) {
    const Display display(options.units);
    const FieldFit& fit = shown.fit;
    std::string out = shown.title.empty() ? "Infiltration test\n" : printable(shown.title) + "\n";
    if (!shown.readings.empty()) out += "  readings from " + printable(shown.readings) + "\n";
    out += fit.pits.size() > 1 ? several_pits(fit, display)
                               : one_pit(fit.pits.front(), fit.options, display);
    out += cautions_part(shown) + "\n" + std::string(kFitCaution) + "\n";
    return out + "By rainledger " + std::string(version()) + ".\n";
}

}  // namespace rainledger
