
#include "scenario/losses_reader.hpp"

// The parameters of each infiltration law.
namespace rainledger {
namespace {

constexpr double kHighRate = 2000.0;     // mm/h: gravel; no soil beyond (common practice)
constexpr double kHighDecay = 100.0;     // 1/h
constexpr double kHighSuction = 2000.0;  // mm
constexpr double kLowSuction = 1.0;      // mm
constexpr double kHighDeficit = 0.6;     // above the porosity of mineral soils
constexpr double kDryDeficit = 0.25;
constexpr const char* kCheckUnit = "check the number and its unit";

void warn_high_rate(const ClosedMap& map, std::string_view key, const std::optional<double>& rate) {
    map.warn_above(key, rate, kHighRate, "any soil (2000 mm/h)", kCheckUnit);
}

std::optional<double> required_rate(const ClosedMap& map, std::string_view key) {
    const auto rate = map.required_quantity(key, Dimension::rate);
    warn_high_rate(map, key, rate);
    return rate;
}

std::optional<Losses> read_horton(const ClosedMap& map) {
    const auto f0 = required_rate(map, "initial_capacity");
    const auto fc = required_rate(map, "final_capacity");
    const auto k = map.required_quantity("decay", Dimension::decay);
    map.warn_above("decay", k, kHighDecay, "100 1/h",
                   "is it per minute? write it as it was published, such as '0.069 1/min'");
    const auto recovery = map.quantity("recovery", Dimension::decay);
    const auto follows = map.word("follows", kFollows);
    const bool elapsed = follows && *follows == 1;
    if (f0 && fc && *f0 < *fc)
        map.reading().error(map.mark_of("final_capacity"),
                            "final_capacity (" + map.shown("final_capacity") +
                                ") is above initial_capacity (" + map.shown("initial_capacity") +
                                ")",
                            "capacity falls from the initial to the final one; exchange them");
    if (elapsed && map.has("recovery"))
        map.reading().error(map.mark_of("recovery"), "recovery does not go with elapsed_time",
                            "capacity that follows the clock never recovers: take recovery out, or "
                            "write 'follows: infiltrated_depth'");
    if (!f0 || !fc || !k) return std::nullopt;
    const HortonCurve curve{*f0, *fc, *k};
    if (elapsed) return HortonElapsed{curve};
    return Horton{curve, recovery.value_or(0.0)};
}

void check_suction(const ClosedMap& map, const std::optional<double>& suction) {
    map.warn_above("wetting_front_suction", suction, kHighSuction, "2000 mm", kCheckUnit);
    if (suction && *suction > 0.0 && *suction < kLowSuction)
        map.reading().warning(
            map.mark_of("wetting_front_suction"),
            "wetting_front_suction is " + map.shown("wetting_front_suction") + ", under 1 mm",
            "is it in another unit? Soils stand between 10 and 2000 mm");
}

void check_deficit(const ClosedMap& map, const std::optional<double>& deficit) {
    map.warn_above("moisture_deficit", deficit, kHighDeficit, "0.6",
                   "a deficit is at most the porosity, about 0.5");
    if (deficit && *deficit > kDryDeficit)
        map.reading().warning(
            map.mark_of("moisture_deficit"),
            "a dry start: a moisture deficit of " + map.shown("moisture_deficit") +
                " is drier than field capacity in every texture class finer than loamy sand",
            "porosity less 33 kPa water content, Rawls, Brakensiek and Saxton 1982, Trans. ASAE 25 "
            "(from memory)");
}

/// Suction times deficit, from the product or from the two; nothing where it is wrong.
std::optional<double> read_suction_deficit(const ClosedMap& map) {
    const auto suction = map.quantity("wetting_front_suction", Dimension::suction);
    const auto deficit = map.fraction("moisture_deficit");
    const auto product = map.quantity("suction_deficit", Dimension::suction);
    check_suction(map, suction);
    check_deficit(map, deficit);
    map.warn_above("suction_deficit", product, kHighSuction, "2000 mm", kCheckUnit);
    const bool has_pair = map.has("wetting_front_suction") || map.has("moisture_deficit");
    if (map.has("suction_deficit") && has_pair) {
        map.reading().error(map.find("suction_deficit")->key_mark,
                            "suction_deficit stands for wetting_front_suction times "
                            "moisture_deficit, which are given too",
                            "keep the product alone, or the two alone");
        return std::nullopt;
    }
    if (map.has("suction_deficit")) return product;
    if (!has_pair && !map.is_misnamed("wetting_front_suction") &&
        !map.is_misnamed("moisture_deficit")) {
        if (!map.is_misnamed("suction_deficit"))
            map.reading().error(
                map.owner_mark(), "green_ampt needs wetting_front_suction and moisture_deficit",
                "add 'wetting_front_suction: 110 mm' and 'moisture_deficit: 0.2', or "
                "their product as 'suction_deficit: 22 mm'");
        return std::nullopt;
    }
    const bool both = map.require("wetting_front_suction", "110 mm") != nullptr &&
                      map.require("moisture_deficit", "0.2") != nullptr;
    if (!both || !suction || !deficit) return std::nullopt;
    return *suction * *deficit;
}

std::optional<Losses> read_green_ampt(const ClosedMap& map) {
    const auto K = required_rate(map, "effective_conductivity");
    const auto S = read_suction_deficit(map);
    const auto limit = map.quantity("storage_limit", Dimension::depth);
    const auto barrier = map.quantity("barrier_rate", Dimension::rate);
    warn_high_rate(map, "barrier_rate", barrier);
    if (map.has("barrier_rate") && !map.has("storage_limit") && !map.is_misnamed("storage_limit"))
        map.reading().error(map.find("barrier_rate")->key_mark,
                            "barrier_rate acts only with a storage_limit",
                            "add 'storage_limit: 60 mm', the pore space above the barrier");
    if (!K || !S) return std::nullopt;
    return GreenAmpt{*K, *S, limit, barrier.value_or(0.0)};
}

std::optional<Losses> read_philip(const ClosedMap& map) {
    const auto Sp = map.required_quantity("sorptivity", Dimension::sorptivity);
    const auto A = required_rate(map, "steady_term");
    if (!Sp || !A) return std::nullopt;
    return Philip{*Sp, *A};
}

std::optional<Losses> read_constant_rate(const ClosedMap& map) {
    const auto rate = required_rate(map, "rate");
    const auto initial = map.quantity("initial_loss", Dimension::depth);
    if (!rate) return std::nullopt;
    return ConstantRate{*rate, initial.value_or(0.0)};
}

std::optional<Losses> read_phi_index(const ClosedMap& map) {
    const auto observed = map.required_quantity("observed_excess", Dimension::depth);
    if (!observed) return std::nullopt;
    return PhiIndex{*observed};
}

struct LawReader {
    std::string_view name;
    Words keys;
    std::optional<Losses> (*read)(const ClosedMap&);
    const char* example;
};

constexpr auto kReaders = std::to_array<LawReader>({
    {"horton", kHortonKeys, read_horton,
     "write 'horton: {initial_capacity: 50 mm/h, final_capacity: 6 mm/h, decay: 4.14 1/h}'"},
    {"green_ampt", kGreenAmptKeys, read_green_ampt,
     "write 'green_ampt: {effective_conductivity: 10.9 mm/h, wetting_front_suction: 110 mm, "
     "moisture_deficit: 0.2}'"},
    {"philip", kPhilipKeys, read_philip,
     "write 'philip: {sorptivity: 12 mm/h^0.5, steady_term: 4 mm/h}'"},
    {"constant_rate", kConstantRateKeys, read_constant_rate,
     "write 'constant_rate: {rate: 7.5 mm/h, initial_loss: 10 mm}'"},
    {"phi_index", kPhiIndexKeys, read_phi_index, "write 'phi_index: {observed_excess: 40 mm}'"},
    {"curve_number", kCurveNumberKeys, read_curve_number, "write 'curve_number: {number: 89}'"},
});

}  // namespace

std::optional<Losses> read_law(const Reading& reading, const Entry& law) {
    for (const LawReader& reader : kReaders) {
        if (reader.name != law.key) continue;
        const auto map = ClosedMap::read(reading, law, law.key, reader.keys, reader.example);
        return map ? reader.read(*map) : std::nullopt;
    }
    return std::nullopt;
}

}  // namespace rainledger
