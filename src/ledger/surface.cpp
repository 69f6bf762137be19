#include "rainledger/ledger/surface.hpp"

#include "rainledger/reference/antecedent.hpp"

namespace rainledger {

double converted_number(const CurveNumber& given) {
    switch (given.antecedent) {
        case AntecedentCondition::I:
            return antecedent_dry(given.number);
        case AntecedentCondition::II:
            return given.number;
        case AntecedentCondition::III:
            return antecedent_wet(given.number);
    }
    return given.number;
}

RetentionCurve retention_curve(const CurveNumber& given) {
    return retention_curve(given, converted_number(given));
}

}  // namespace rainledger
