#include "report/curve_number_words.hpp"

#include "rainledger/ledger/surface.hpp"
#include "rainledger/reference/antecedent.hpp"

namespace rainledger {
namespace {

constexpr std::string_view kRatioSource =
    "Hawkins, Jiang, Woodward, Hjelmfelt and Van Mullem 2002, S005 = 1.33 S020^1.15 in inches";

}  // namespace

CurveNumberInUse number_in_use(const CurveNumber& given) {
    CurveNumberInUse use;
    use.curve = retention_curve(given);
    use.for_condition = converted_number(given);
    use.condition_converted = given.antecedent != AntecedentCondition::II;
    use.ratio_converted = use.curve.retention_mm != retention_mm(use.for_condition);
    use.number_used =
        use.ratio_converted ? curve_number_of(use.curve.retention_mm) : use.for_condition;
    return use;
}

std::string_view condition_name(AntecedentCondition condition) {
    switch (condition) {
        case AntecedentCondition::I:
            return "I";
        case AntecedentCondition::II:
            return "II";
        case AntecedentCondition::III:
            return "III";
    }
    return "";
}

std::string conversion_source(const CurveNumberInUse& use) {
    std::string out;
    if (use.condition_converted) out += kAntecedentSource;
    if (use.condition_converted && use.ratio_converted) out += "; ";
    if (use.ratio_converted) out += kRatioSource;
    return out;
}

}  // namespace rainledger
