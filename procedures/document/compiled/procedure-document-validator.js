'use strict';
// Made by build-validators.mjs from the schema; not to be edited.

exports.checkProcedureDocument = validate52;
const schema19 = {"$schema":"https://json-schema.org/draft/2020-12/schema","$id":"procedure-document.schema.json","title":"Procedure document","description":"What a lead authors, a version freezes and a run walks. Agrees with procedure-document.ts; what lies between the parts (names, ways, restoring) is the lint's.","type":"object","properties":{"format":{"const":1},"id":{"$ref":"#/$defs/procedureId"},"title":{"$ref":"#/$defs/label"},"purpose":{"$ref":"#/$defs/paragraph"},"system":{"$ref":"#/$defs/label"},"appliesTo":{"$ref":"#/$defs/appliesTo"},"expectedMinutes":{"type":"integer","minimum":1,"maximum":1440},"useLevel":{"enum":["every-step","consulted"]},"pair":{"type":"boolean"},"gear":{"type":"array","items":{"$ref":"#/$defs/gearNeed"},"maxItems":30},"inputs":{"type":"array","items":{"$ref":"#/$defs/input"},"maxItems":100},"pictures":{"type":"array","items":{"$ref":"#/$defs/identifier"},"maxItems":30},"references":{"type":"array","items":{"$ref":"#/$defs/line"},"maxItems":50},"deference":{"$ref":"#/$defs/paragraph"},"start":{"$ref":"#/$defs/startCard"},"limits":{"type":"array","items":{"$ref":"#/$defs/limit"},"maxItems":20},"stop":{"$ref":"#/$defs/stopSheet"},"steps":{"type":"array","items":{"$ref":"#/$defs/step"},"minItems":2,"maxItems":500}},"required":["format","id","title","purpose","system","appliesTo","expectedMinutes","useLevel","gear","inputs","pictures","references","deference","start","limits","stop","steps"],"additionalProperties":false,"$defs":{"unit":{"enum":["kPa","Pa","hPa","bar","psi","inHg","inH2O","mmHg","degC","degF","K","L/min","ft3/min","m3/s","g/s","kg/h","lb/min","L","cm3","mm","m","km","mi","Nm","lbf.ft","V","mV","ohm","kohm","s","min","h","km/h","mph","%","1","rpm","dB"]},"sense":{"description":"Gauge and absolute are different kinds.","enum":["absolute","gauge"]},"name":{"description":"A name in expressions: letters and digits, first letter small.","type":"string","pattern":"^[a-z][A-Za-z0-9]*$","maxLength":60},"identifier":{"description":"Letters, digits and hyphens.","type":"string","pattern":"^[A-Za-z][A-Za-z0-9-]*$","maxLength":60},"procedureId":{"description":"Lower-case words joined by hyphens.","type":"string","pattern":"^[a-z0-9]+(-[a-z0-9]+)*$","maxLength":80},"decimal":{"description":"A figure as text, with the digits that it was given with.","type":"string","pattern":"^-?[0-9]+(\\.[0-9]+)?$","maxLength":20},"expression":{"description":"Text in the expression language.","type":"string","minLength":1,"maxLength":2000},"label":{"type":"string","minLength":1,"maxLength":120},"line":{"type":"string","minLength":1,"maxLength":300},"paragraph":{"description":"May be a template: {name} stands for a value of the run.","type":"string","minLength":1,"maxLength":1000},"range":{"type":"object","properties":{"low":{"type":"number"},"high":{"type":"number"}},"required":["low","high"],"additionalProperties":false},"caution":{"type":"object","properties":{"word":{"enum":["danger","warning","caution","notice"]},"text":{"$ref":"#/$defs/paragraph"}},"required":["word","text"],"additionalProperties":false},"appliesTo":{"type":"object","properties":{"codes":{"type":"array","items":{"type":"string","pattern":"^[PCBU][0-3][0-9A-F]{3}$"},"maxItems":100},"symptoms":{"type":"array","items":{"$ref":"#/$defs/line"},"maxItems":30},"engine":{"type":"array","items":{"$ref":"#/$defs/line"},"maxItems":30}},"required":["codes","symptoms","engine"],"additionalProperties":false},"instrumentKind":{"enum":["pressure-gauge","scan-tool","listening-probe","barometer","thermometer"]},"gearNeed":{"type":"object","properties":{"role":{"$ref":"#/$defs/name"},"kind":{"$ref":"#/$defs/instrumentKind"},"label":{"$ref":"#/$defs/label"},"optional":{"type":"boolean"},"shows":{"type":"object","properties":{"unit":{"$ref":"#/$defs/unit"},"low":{"type":"number"},"high":{"type":"number"},"resolution":{"type":"number","exclusiveMinimum":0}},"required":["unit","low","high","resolution"],"additionalProperties":false}},"required":["role","kind","label"],"additionalProperties":false},"input":{"type":"object","properties":{"name":{"$ref":"#/$defs/name"},"label":{"$ref":"#/$defs/label"},"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"},"from":{"enum":["site.elevation","visit.displacement","default"]},"default":{"$ref":"#/$defs/decimal"},"source":{"$ref":"#/$defs/line"}},"required":["name","label","unit","from","source"],"additionalProperties":false},"startCard":{"type":"object","properties":{"prerequisites":{"type":"array","items":{"$ref":"#/$defs/line"},"maxItems":20},"stopActions":{"type":"array","items":{"$ref":"#/$defs/line"},"minItems":1,"maxItems":3},"people":{"$ref":"#/$defs/line"},"throughout":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12}},"required":["prerequisites","stopActions","people","throughout"],"additionalProperties":false},"limit":{"type":"object","properties":{"id":{"$ref":"#/$defs/identifier"},"holds":{"$ref":"#/$defs/expression"},"of":{"type":"array","items":{"$ref":"#/$defs/name"},"minItems":1,"maxItems":50},"says":{"$ref":"#/$defs/line"},"then":{"$ref":"#/$defs/line"}},"required":["id","holds","of","says","then"],"additionalProperties":false},"exit":{"type":"object","properties":{"to":{"description":"A step's id, or `verdict`.","type":"string","pattern":"^[A-Za-z][A-Za-z0-9-]*$","maxLength":60},"because":{"$ref":"#/$defs/line"},"verdict":{"$ref":"#/$defs/name"}},"required":["to","because"],"additionalProperties":false},"branch":{"type":"object","properties":{"to":{"description":"A step's id, or `verdict`.","type":"string","pattern":"^[A-Za-z][A-Za-z0-9-]*$","maxLength":60},"because":{"$ref":"#/$defs/line"},"verdict":{"$ref":"#/$defs/name"},"when":{"$ref":"#/$defs/expression"},"atMost":{"type":"integer","minimum":1,"maximum":20},"thenceforth":{"$ref":"#/$defs/exit"}},"required":["to","because","when"],"dependentRequired":{"atMost":["thenceforth"],"thenceforth":["atMost"]},"additionalProperties":false},"stopSheet":{"type":"object","properties":{"makeSafe":{"type":"array","items":{"$ref":"#/$defs/line"},"minItems":1,"maxItems":12},"exit":{"$ref":"#/$defs/exit"}},"required":["makeSafe","exit"],"additionalProperties":false},"band":{"type":"object","properties":{"low":{"$ref":"#/$defs/expression"},"high":{"$ref":"#/$defs/expression"},"when":{"$ref":"#/$defs/expression"},"unjudged":{"$ref":"#/$defs/line"},"source":{"$ref":"#/$defs/line"}},"required":["source"],"anyOf":[{"required":["low"]},{"required":["high"]}],"additionalProperties":false},"result":{"type":"object","properties":{"name":{"$ref":"#/$defs/name"},"label":{"$ref":"#/$defs/label"},"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"},"band":{"$ref":"#/$defs/band"},"is":{"$ref":"#/$defs/expression"}},"required":["name","label","unit","is"],"additionalProperties":false},"entry":{"type":"object","properties":{"name":{"$ref":"#/$defs/name"},"label":{"$ref":"#/$defs/label"},"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"},"plausible":{"$ref":"#/$defs/range"},"gear":{"$ref":"#/$defs/name"}},"required":["name","label","unit","plausible"],"additionalProperties":false},"entryWay":{"type":"object","properties":{"id":{"$ref":"#/$defs/identifier"},"label":{"$ref":"#/$defs/label"},"hint":{"$ref":"#/$defs/line"},"entry":{"$ref":"#/$defs/entry"},"is":{"$ref":"#/$defs/expression"},"uncertainty":{"$ref":"#/$defs/expression"}},"required":["id","label","hint","is"],"additionalProperties":false},"readQuantity":{"type":"object","properties":{"name":{"$ref":"#/$defs/name"},"label":{"$ref":"#/$defs/label"},"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"},"band":{"$ref":"#/$defs/band"},"gear":{"$ref":"#/$defs/name"},"plausible":{"$ref":"#/$defs/range"},"takes":{"type":"integer","minimum":1,"maximum":5},"ways":{"type":"array","items":{"$ref":"#/$defs/entryWay"},"minItems":1,"maxItems":10},"validity":{"$ref":"#/$defs/validity"}},"required":["name","label","unit","plausible"],"additionalProperties":false},"picture":{"type":"object","properties":{"sheet":{"$ref":"#/$defs/identifier"},"marks":{"type":"array","items":{"$ref":"#/$defs/identifier"},"maxItems":30},"labels":{"type":"object","propertyNames":{"pattern":"^[A-Za-z][A-Za-z0-9-]*$","maxLength":60},"maxProperties":30,"additionalProperties":{"$ref":"#/$defs/label"}}},"required":["sheet","marks"],"additionalProperties":false},"disturbed":{"type":"object","properties":{"item":{"$ref":"#/$defs/identifier"},"label":{"$ref":"#/$defs/label"},"restore":{"$ref":"#/$defs/line"}},"required":["item","label","restore"],"additionalProperties":false},"option":{"type":"object","properties":{"name":{"$ref":"#/$defs/name"},"label":{"$ref":"#/$defs/label"},"ask":{"$ref":"#/$defs/line"},"alone":{"type":"boolean"},"picture":{"$ref":"#/$defs/picture"}},"required":["name","label"],"additionalProperties":false},"channel":{"type":"object","properties":{"name":{"enum":["gauge","manifold","boost","sound"]},"label":{"$ref":"#/$defs/label"},"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"},"gear":{"$ref":"#/$defs/name"},"needed":{"type":"boolean"}},"required":["name","label","unit","needed"],"additionalProperties":false},"foundTruth":{"type":"object","properties":{"what":{"enum":["noise-heard","noise-stopped"]},"name":{"$ref":"#/$defs/name"}},"required":["what","name"],"additionalProperties":false},"foundQuantity":{"type":"object","properties":{"what":{"enum":["seal-point","highest-gauge","rise-rate","manifold-gain","boost-gain","worst-gap"]},"name":{"$ref":"#/$defs/name"},"label":{"$ref":"#/$defs/label"},"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"},"band":{"$ref":"#/$defs/band"}},"required":["what","name","label","unit"],"additionalProperties":false},"found":{"type":"object","discriminator":{"propertyName":"what"},"required":["what"],"oneOf":[{"$ref":"#/$defs/foundTruth"},{"$ref":"#/$defs/foundQuantity"}]},"driveWindow":{"type":"object","properties":{"name":{"$ref":"#/$defs/name"},"label":{"$ref":"#/$defs/label"},"what":{"$ref":"#/$defs/line"}},"required":["name","label","what"],"additionalProperties":false},"sentence":{"type":"object","properties":{"text":{"$ref":"#/$defs/paragraph"},"when":{"$ref":"#/$defs/expression"}},"required":["text"],"additionalProperties":false},"startStep":{"type":"object","properties":{"kind":{"const":"start"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30}},"required":["id","number","title","action","kind","otherwise"],"additionalProperties":false},"actionStep":{"type":"object","properties":{"kind":{"const":"action"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30}},"required":["id","number","title","action","kind","otherwise"],"additionalProperties":false},"readingStep":{"type":"object","properties":{"kind":{"const":"reading"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"reads":{"type":"array","items":{"$ref":"#/$defs/readQuantity"},"minItems":1,"maxItems":20},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"cannotMeasure":{"$ref":"#/$defs/exit"}},"required":["id","number","title","action","kind","otherwise","cannotMeasure","reads"],"additionalProperties":false},"choiceStep":{"type":"object","properties":{"kind":{"const":"choice"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"name":{"$ref":"#/$defs/name"},"several":{"type":"boolean"},"options":{"type":"array","items":{"$ref":"#/$defs/option"},"minItems":1,"maxItems":30},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"cannotMeasure":{"$ref":"#/$defs/exit"}},"required":["id","number","title","action","kind","otherwise","cannotMeasure","name","options"],"additionalProperties":false},"listenStep":{"type":"object","properties":{"kind":{"const":"listen"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"name":{"$ref":"#/$defs/name"},"channels":{"type":"array","items":{"$ref":"#/$defs/channel"},"minItems":1,"maxItems":4},"target":{"type":"number"},"finds":{"type":"array","items":{"$ref":"#/$defs/found"},"minItems":1,"maxItems":20},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"cannotMeasure":{"$ref":"#/$defs/exit"}},"required":["id","number","title","action","kind","otherwise","cannotMeasure","name","channels","target","finds"],"additionalProperties":false},"holdStep":{"type":"object","properties":{"kind":{"const":"hold"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"heldAs":{"$ref":"#/$defs/name"},"seconds":{"type":"integer","minimum":1,"maximum":86400},"begins":{"type":"array","items":{"$ref":"#/$defs/readQuantity"},"minItems":1,"maxItems":20},"ends":{"type":"array","items":{"$ref":"#/$defs/readQuantity"},"minItems":1,"maxItems":20},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"cannotMeasure":{"$ref":"#/$defs/exit"}},"required":["id","number","title","action","kind","otherwise","cannotMeasure","seconds"],"additionalProperties":false},"waitStep":{"type":"object","properties":{"kind":{"const":"wait"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"reads":{"type":"array","items":{"$ref":"#/$defs/readQuantity"},"minItems":1,"maxItems":20},"until":{"$ref":"#/$defs/expression"},"atLeastSeconds":{"type":"integer","minimum":1,"maximum":86400},"meanwhile":{"$ref":"#/$defs/paragraph"},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"cannotMeasure":{"$ref":"#/$defs/exit"}},"required":["id","number","title","action","kind","otherwise","cannotMeasure","reads","until","meanwhile"],"additionalProperties":false},"codesStep":{"type":"object","properties":{"kind":{"const":"codes"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"name":{"$ref":"#/$defs/name"},"comparedWith":{"$ref":"#/$defs/name"},"newCodes":{"$ref":"#/$defs/name"},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"cannotMeasure":{"$ref":"#/$defs/exit"}},"required":["id","number","title","action","kind","otherwise","cannotMeasure","name"],"additionalProperties":false},"driveStep":{"type":"object","properties":{"kind":{"const":"drive"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"name":{"$ref":"#/$defs/name"},"windows":{"type":"array","items":{"$ref":"#/$defs/driveWindow"},"minItems":1,"maxItems":20},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"cannotMeasure":{"$ref":"#/$defs/exit"}},"required":["id","number","title","action","kind","otherwise","cannotMeasure","name","windows"],"additionalProperties":false},"computeStep":{"type":"object","properties":{"kind":{"const":"compute"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30}},"required":["id","number","title","action","kind","otherwise"],"additionalProperties":false},"restoreStep":{"type":"object","properties":{"kind":{"const":"restore"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30}},"required":["id","number","title","action","kind","otherwise"],"additionalProperties":false},"findingStep":{"type":"object","properties":{"kind":{"const":"finding"},"id":{"$ref":"#/$defs/name"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"result":{"enum":["in","out","too-close","not-judged"]},"verdict":{"$ref":"#/$defs/paragraph"},"cause":{"type":"array","items":{"$ref":"#/$defs/sentence"},"maxItems":60},"correction":{"type":"array","items":{"$ref":"#/$defs/sentence"},"maxItems":60},"customer":{"type":"array","items":{"$ref":"#/$defs/sentence"},"maxItems":60},"nextProcedure":{"$ref":"#/$defs/procedureId"}},"required":["id","number","title","action","kind","result","verdict","cause","correction","customer"],"additionalProperties":false},"validity":{"type":"object","description":"Ends after minutes, or when one of the steps is done.","properties":{"minutes":{"type":"number","exclusiveMinimum":0,"maximum":1440},"until":{"type":"array","items":{"$ref":"#/$defs/identifier"},"minItems":1,"maxItems":30},"because":{"$ref":"#/$defs/line"}},"required":["because"],"anyOf":[{"required":["minutes"]},{"required":["until"]}],"additionalProperties":false},"releasePoint":{"type":"object","properties":{"by":{"enum":["lead","manager"]},"evidence":{"$ref":"#/$defs/line"}},"required":["by","evidence"],"additionalProperties":false},"verification":{"type":"object","properties":{"how":{"enum":["independent","concurrent"]},"what":{"$ref":"#/$defs/line"}},"required":["how","what"],"additionalProperties":false},"takenResult":{"type":"object","properties":{"name":{"$ref":"#/$defs/name"},"label":{"$ref":"#/$defs/label"},"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"},"band":{"$ref":"#/$defs/band"},"from":{"$ref":"#/$defs/name"}},"required":["name","label","unit","from"],"additionalProperties":false},"calledFinding":{"type":"object","properties":{"finding":{"$ref":"#/$defs/name"},"name":{"$ref":"#/$defs/name"}},"required":["finding","name"],"additionalProperties":false},"rampStep":{"type":"object","properties":{"kind":{"const":"ramp"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"name":{"$ref":"#/$defs/name"},"channels":{"type":"array","items":{"$ref":"#/$defs/channel"},"minItems":1,"maxItems":4},"target":{"type":"number"},"finds":{"type":"array","items":{"$ref":"#/$defs/foundQuantity"},"minItems":1,"maxItems":20},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"cannotMeasure":{"$ref":"#/$defs/exit"}},"required":["id","number","title","action","kind","otherwise","cannotMeasure","name","channels","target","finds"],"additionalProperties":false},"photoStep":{"type":"object","properties":{"kind":{"const":"photo"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"cannotMeasure":{"$ref":"#/$defs/exit"},"name":{"$ref":"#/$defs/name"},"shows":{"type":"array","items":{"$ref":"#/$defs/line"},"minItems":1,"maxItems":10}},"required":["id","number","title","action","kind","otherwise","cannotMeasure","name","shows"],"additionalProperties":false},"callStep":{"type":"object","properties":{"kind":{"const":"call"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"procedure":{"$ref":"#/$defs/procedureId"},"version":{"type":"integer","minimum":1,"maximum":100000},"takes":{"type":"array","items":{"$ref":"#/$defs/takenResult"},"maxItems":30},"finds":{"type":"array","items":{"$ref":"#/$defs/calledFinding"},"maxItems":30}},"required":["id","number","title","action","kind","otherwise","procedure","version","takes","finds"],"additionalProperties":false},"step":{"type":"object","discriminator":{"propertyName":"kind"},"required":["kind"],"oneOf":[{"$ref":"#/$defs/startStep"},{"$ref":"#/$defs/actionStep"},{"$ref":"#/$defs/readingStep"},{"$ref":"#/$defs/choiceStep"},{"$ref":"#/$defs/listenStep"},{"$ref":"#/$defs/holdStep"},{"$ref":"#/$defs/waitStep"},{"$ref":"#/$defs/codesStep"},{"$ref":"#/$defs/driveStep"},{"$ref":"#/$defs/computeStep"},{"$ref":"#/$defs/restoreStep"},{"$ref":"#/$defs/findingStep"},{"$ref":"#/$defs/rampStep"},{"$ref":"#/$defs/photoStep"},{"$ref":"#/$defs/callStep"}]}}};
const func1 = Object.prototype.hasOwnProperty;
const schema20 = {"description":"Lower-case words joined by hyphens.","type":"string","pattern":"^[a-z0-9]+(-[a-z0-9]+)*$","maxLength":80};
const func2 = (text) => [...text].length;
const pattern3 = new RegExp("^[a-z0-9]+(-[a-z0-9]+)*$", "u");

function validate53(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate53.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(typeof data === "string"){
if(func2(data) > 80){
const err0 = {instancePath,schemaPath:"#/maxLength",keyword:"maxLength",params:{limit: 80},message:"must NOT have more than 80 characters"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(!pattern3.test(data)){
const err1 = {instancePath,schemaPath:"#/pattern",keyword:"pattern",params:{pattern: "^[a-z0-9]+(-[a-z0-9]+)*$"},message:"must match pattern \""+"^[a-z0-9]+(-[a-z0-9]+)*$"+"\""};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
else {
const err2 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
validate53.errors = vErrors;
return errors === 0;
}
validate53.evaluated = {"dynamicProps":false,"dynamicItems":false};

const schema21 = {"type":"string","minLength":1,"maxLength":120};

function validate55(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate55.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(typeof data === "string"){
if(func2(data) > 120){
const err0 = {instancePath,schemaPath:"#/maxLength",keyword:"maxLength",params:{limit: 120},message:"must NOT have more than 120 characters"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(func2(data) < 1){
const err1 = {instancePath,schemaPath:"#/minLength",keyword:"minLength",params:{limit: 1},message:"must NOT have fewer than 1 characters"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
else {
const err2 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
validate55.errors = vErrors;
return errors === 0;
}
validate55.evaluated = {"dynamicProps":false,"dynamicItems":false};

const schema22 = {"description":"May be a template: {name} stands for a value of the run.","type":"string","minLength":1,"maxLength":1000};

function validate57(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate57.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(typeof data === "string"){
if(func2(data) > 1000){
const err0 = {instancePath,schemaPath:"#/maxLength",keyword:"maxLength",params:{limit: 1000},message:"must NOT have more than 1000 characters"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(func2(data) < 1){
const err1 = {instancePath,schemaPath:"#/minLength",keyword:"minLength",params:{limit: 1},message:"must NOT have fewer than 1 characters"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
else {
const err2 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
validate57.errors = vErrors;
return errors === 0;
}
validate57.evaluated = {"dynamicProps":false,"dynamicItems":false};

const schema23 = {"type":"object","properties":{"codes":{"type":"array","items":{"type":"string","pattern":"^[PCBU][0-3][0-9A-F]{3}$"},"maxItems":100},"symptoms":{"type":"array","items":{"$ref":"#/$defs/line"},"maxItems":30},"engine":{"type":"array","items":{"$ref":"#/$defs/line"},"maxItems":30}},"required":["codes","symptoms","engine"],"additionalProperties":false};
const pattern4 = new RegExp("^[PCBU][0-3][0-9A-F]{3}$", "u");
const schema24 = {"type":"string","minLength":1,"maxLength":300};

function validate61(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate61.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(typeof data === "string"){
if(func2(data) > 300){
const err0 = {instancePath,schemaPath:"#/maxLength",keyword:"maxLength",params:{limit: 300},message:"must NOT have more than 300 characters"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(func2(data) < 1){
const err1 = {instancePath,schemaPath:"#/minLength",keyword:"minLength",params:{limit: 1},message:"must NOT have fewer than 1 characters"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
else {
const err2 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
validate61.errors = vErrors;
return errors === 0;
}
validate61.evaluated = {"dynamicProps":false,"dynamicItems":false};


function validate60(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate60.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.codes === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "codes"},message:"must have required property '"+"codes"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.symptoms === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "symptoms"},message:"must have required property '"+"symptoms"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.engine === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "engine"},message:"must have required property '"+"engine"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
for(const key0 in data){
if(!(((key0 === "codes") || (key0 === "symptoms")) || (key0 === "engine"))){
const err3 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
if(data.codes !== undefined){
let data0 = data.codes;
if(Array.isArray(data0)){
if(data0.length > 100){
const err4 = {instancePath:instancePath+"/codes",schemaPath:"#/properties/codes/maxItems",keyword:"maxItems",params:{limit: 100},message:"must NOT have more than 100 items"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
const len0 = data0.length;
for(let i0=0; i0<len0; i0++){
let data1 = data0[i0];
if(typeof data1 === "string"){
if(!pattern4.test(data1)){
const err5 = {instancePath:instancePath+"/codes/" + i0,schemaPath:"#/properties/codes/items/pattern",keyword:"pattern",params:{pattern: "^[PCBU][0-3][0-9A-F]{3}$"},message:"must match pattern \""+"^[PCBU][0-3][0-9A-F]{3}$"+"\""};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
else {
const err6 = {instancePath:instancePath+"/codes/" + i0,schemaPath:"#/properties/codes/items/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
}
}
else {
const err7 = {instancePath:instancePath+"/codes",schemaPath:"#/properties/codes/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
}
if(data.symptoms !== undefined){
let data2 = data.symptoms;
if(Array.isArray(data2)){
if(data2.length > 30){
const err8 = {instancePath:instancePath+"/symptoms",schemaPath:"#/properties/symptoms/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
const len1 = data2.length;
for(let i1=0; i1<len1; i1++){
if(!(validate61(data2[i1], {instancePath:instancePath+"/symptoms/" + i1,parentData:data2,parentDataProperty:i1,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
}
else {
const err9 = {instancePath:instancePath+"/symptoms",schemaPath:"#/properties/symptoms/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
if(data.engine !== undefined){
let data4 = data.engine;
if(Array.isArray(data4)){
if(data4.length > 30){
const err10 = {instancePath:instancePath+"/engine",schemaPath:"#/properties/engine/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
const len2 = data4.length;
for(let i2=0; i2<len2; i2++){
if(!(validate61(data4[i2], {instancePath:instancePath+"/engine/" + i2,parentData:data4,parentDataProperty:i2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
}
else {
const err11 = {instancePath:instancePath+"/engine",schemaPath:"#/properties/engine/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
}
}
else {
const err12 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
validate60.errors = vErrors;
return errors === 0;
}
validate60.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema25 = {"type":"object","properties":{"role":{"$ref":"#/$defs/name"},"kind":{"$ref":"#/$defs/instrumentKind"},"label":{"$ref":"#/$defs/label"},"optional":{"type":"boolean"},"shows":{"type":"object","properties":{"unit":{"$ref":"#/$defs/unit"},"low":{"type":"number"},"high":{"type":"number"},"resolution":{"type":"number","exclusiveMinimum":0}},"required":["unit","low","high","resolution"],"additionalProperties":false}},"required":["role","kind","label"],"additionalProperties":false};
const schema26 = {"description":"A name in expressions: letters and digits, first letter small.","type":"string","pattern":"^[a-z][A-Za-z0-9]*$","maxLength":60};
const pattern5 = new RegExp("^[a-z][A-Za-z0-9]*$", "u");

function validate66(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate66.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(typeof data === "string"){
if(func2(data) > 60){
const err0 = {instancePath,schemaPath:"#/maxLength",keyword:"maxLength",params:{limit: 60},message:"must NOT have more than 60 characters"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(!pattern5.test(data)){
const err1 = {instancePath,schemaPath:"#/pattern",keyword:"pattern",params:{pattern: "^[a-z][A-Za-z0-9]*$"},message:"must match pattern \""+"^[a-z][A-Za-z0-9]*$"+"\""};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
else {
const err2 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
validate66.errors = vErrors;
return errors === 0;
}
validate66.evaluated = {"dynamicProps":false,"dynamicItems":false};

const schema27 = {"enum":["pressure-gauge","scan-tool","listening-probe","barometer","thermometer"]};

function validate68(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate68.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(!(((((data === "pressure-gauge") || (data === "scan-tool")) || (data === "listening-probe")) || (data === "barometer")) || (data === "thermometer"))){
const err0 = {instancePath,schemaPath:"#/enum",keyword:"enum",params:{allowedValues: schema27.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
validate68.errors = vErrors;
return errors === 0;
}
validate68.evaluated = {"dynamicProps":false,"dynamicItems":false};

const schema28 = {"enum":["kPa","Pa","hPa","bar","psi","inHg","inH2O","mmHg","degC","degF","K","L/min","ft3/min","m3/s","g/s","kg/h","lb/min","L","cm3","mm","m","km","mi","Nm","lbf.ft","V","mV","ohm","kohm","s","min","h","km/h","mph","%","1","rpm","dB"]};

function validate71(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate71.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(!((((((((((((((((((((((((((((((((((((((data === "kPa") || (data === "Pa")) || (data === "hPa")) || (data === "bar")) || (data === "psi")) || (data === "inHg")) || (data === "inH2O")) || (data === "mmHg")) || (data === "degC")) || (data === "degF")) || (data === "K")) || (data === "L/min")) || (data === "ft3/min")) || (data === "m3/s")) || (data === "g/s")) || (data === "kg/h")) || (data === "lb/min")) || (data === "L")) || (data === "cm3")) || (data === "mm")) || (data === "m")) || (data === "km")) || (data === "mi")) || (data === "Nm")) || (data === "lbf.ft")) || (data === "V")) || (data === "mV")) || (data === "ohm")) || (data === "kohm")) || (data === "s")) || (data === "min")) || (data === "h")) || (data === "km/h")) || (data === "mph")) || (data === "%")) || (data === "1")) || (data === "rpm")) || (data === "dB"))){
const err0 = {instancePath,schemaPath:"#/enum",keyword:"enum",params:{allowedValues: schema28.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
validate71.errors = vErrors;
return errors === 0;
}
validate71.evaluated = {"dynamicProps":false,"dynamicItems":false};


function validate65(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate65.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.role === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "role"},message:"must have required property '"+"role"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.kind === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "kind"},message:"must have required property '"+"kind"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.label === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "label"},message:"must have required property '"+"label"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
for(const key0 in data){
if(!(((((key0 === "role") || (key0 === "kind")) || (key0 === "label")) || (key0 === "optional")) || (key0 === "shows"))){
const err3 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
if(data.role !== undefined){
if(!(validate66(data.role, {instancePath:instancePath+"/role",parentData:data,parentDataProperty:"role",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.kind !== undefined){
if(!(validate68(data.kind, {instancePath:instancePath+"/kind",parentData:data,parentDataProperty:"kind",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate68.errors : vErrors.concat(validate68.errors);
errors = vErrors.length;
}
}
if(data.label !== undefined){
if(!(validate55(data.label, {instancePath:instancePath+"/label",parentData:data,parentDataProperty:"label",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.optional !== undefined){
if(typeof data.optional !== "boolean"){
const err4 = {instancePath:instancePath+"/optional",schemaPath:"#/properties/optional/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
if(data.shows !== undefined){
let data4 = data.shows;
if(data4 && typeof data4 == "object" && !Array.isArray(data4)){
if(data4.unit === undefined){
const err5 = {instancePath:instancePath+"/shows",schemaPath:"#/properties/shows/required",keyword:"required",params:{missingProperty: "unit"},message:"must have required property '"+"unit"+"'"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
if(data4.low === undefined){
const err6 = {instancePath:instancePath+"/shows",schemaPath:"#/properties/shows/required",keyword:"required",params:{missingProperty: "low"},message:"must have required property '"+"low"+"'"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(data4.high === undefined){
const err7 = {instancePath:instancePath+"/shows",schemaPath:"#/properties/shows/required",keyword:"required",params:{missingProperty: "high"},message:"must have required property '"+"high"+"'"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
if(data4.resolution === undefined){
const err8 = {instancePath:instancePath+"/shows",schemaPath:"#/properties/shows/required",keyword:"required",params:{missingProperty: "resolution"},message:"must have required property '"+"resolution"+"'"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
for(const key1 in data4){
if(!((((key1 === "unit") || (key1 === "low")) || (key1 === "high")) || (key1 === "resolution"))){
const err9 = {instancePath:instancePath+"/shows",schemaPath:"#/properties/shows/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key1},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
if(data4.unit !== undefined){
if(!(validate71(data4.unit, {instancePath:instancePath+"/shows/unit",parentData:data4,parentDataProperty:"unit",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate71.errors : vErrors.concat(validate71.errors);
errors = vErrors.length;
}
}
if(data4.low !== undefined){
let data6 = data4.low;
if(!((typeof data6 == "number") && (isFinite(data6)))){
const err10 = {instancePath:instancePath+"/shows/low",schemaPath:"#/properties/shows/properties/low/type",keyword:"type",params:{type: "number"},message:"must be number"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
if(data4.high !== undefined){
let data7 = data4.high;
if(!((typeof data7 == "number") && (isFinite(data7)))){
const err11 = {instancePath:instancePath+"/shows/high",schemaPath:"#/properties/shows/properties/high/type",keyword:"type",params:{type: "number"},message:"must be number"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
}
if(data4.resolution !== undefined){
let data8 = data4.resolution;
if((typeof data8 == "number") && (isFinite(data8))){
if(data8 <= 0 || isNaN(data8)){
const err12 = {instancePath:instancePath+"/shows/resolution",schemaPath:"#/properties/shows/properties/resolution/exclusiveMinimum",keyword:"exclusiveMinimum",params:{comparison: ">", limit: 0},message:"must be > 0"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
}
else {
const err13 = {instancePath:instancePath+"/shows/resolution",schemaPath:"#/properties/shows/properties/resolution/type",keyword:"type",params:{type: "number"},message:"must be number"};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
}
}
else {
const err14 = {instancePath:instancePath+"/shows",schemaPath:"#/properties/shows/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err14];
}
else {
vErrors.push(err14);
}
errors++;
}
}
}
else {
const err15 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err15];
}
else {
vErrors.push(err15);
}
errors++;
}
validate65.errors = vErrors;
return errors === 0;
}
validate65.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema29 = {"type":"object","properties":{"name":{"$ref":"#/$defs/name"},"label":{"$ref":"#/$defs/label"},"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"},"from":{"enum":["site.elevation","visit.displacement","default"]},"default":{"$ref":"#/$defs/decimal"},"source":{"$ref":"#/$defs/line"}},"required":["name","label","unit","from","source"],"additionalProperties":false};
const schema30 = {"description":"Gauge and absolute are different kinds.","enum":["absolute","gauge"]};

function validate78(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate78.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(!((data === "absolute") || (data === "gauge"))){
const err0 = {instancePath,schemaPath:"#/enum",keyword:"enum",params:{allowedValues: schema30.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
validate78.errors = vErrors;
return errors === 0;
}
validate78.evaluated = {"dynamicProps":false,"dynamicItems":false};

const schema31 = {"description":"A figure as text, with the digits that it was given with.","type":"string","pattern":"^-?[0-9]+(\\.[0-9]+)?$","maxLength":20};
const pattern6 = new RegExp("^-?[0-9]+(\\.[0-9]+)?$", "u");

function validate80(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate80.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(typeof data === "string"){
if(func2(data) > 20){
const err0 = {instancePath,schemaPath:"#/maxLength",keyword:"maxLength",params:{limit: 20},message:"must NOT have more than 20 characters"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(!pattern6.test(data)){
const err1 = {instancePath,schemaPath:"#/pattern",keyword:"pattern",params:{pattern: "^-?[0-9]+(\\.[0-9]+)?$"},message:"must match pattern \""+"^-?[0-9]+(\\.[0-9]+)?$"+"\""};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
else {
const err2 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
validate80.errors = vErrors;
return errors === 0;
}
validate80.evaluated = {"dynamicProps":false,"dynamicItems":false};


function validate74(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate74.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.name === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.label === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "label"},message:"must have required property '"+"label"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.unit === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "unit"},message:"must have required property '"+"unit"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.from === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "from"},message:"must have required property '"+"from"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.source === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "source"},message:"must have required property '"+"source"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
for(const key0 in data){
if(!(((((((key0 === "name") || (key0 === "label")) || (key0 === "unit")) || (key0 === "sense")) || (key0 === "from")) || (key0 === "default")) || (key0 === "source"))){
const err5 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
if(data.name !== undefined){
if(!(validate66(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.label !== undefined){
if(!(validate55(data.label, {instancePath:instancePath+"/label",parentData:data,parentDataProperty:"label",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.unit !== undefined){
if(!(validate71(data.unit, {instancePath:instancePath+"/unit",parentData:data,parentDataProperty:"unit",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate71.errors : vErrors.concat(validate71.errors);
errors = vErrors.length;
}
}
if(data.sense !== undefined){
if(!(validate78(data.sense, {instancePath:instancePath+"/sense",parentData:data,parentDataProperty:"sense",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate78.errors : vErrors.concat(validate78.errors);
errors = vErrors.length;
}
}
if(data.from !== undefined){
let data4 = data.from;
if(!(((data4 === "site.elevation") || (data4 === "visit.displacement")) || (data4 === "default"))){
const err6 = {instancePath:instancePath+"/from",schemaPath:"#/properties/from/enum",keyword:"enum",params:{allowedValues: schema29.properties.from.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
}
if(data.default !== undefined){
if(!(validate80(data.default, {instancePath:instancePath+"/default",parentData:data,parentDataProperty:"default",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate80.errors : vErrors.concat(validate80.errors);
errors = vErrors.length;
}
}
if(data.source !== undefined){
if(!(validate61(data.source, {instancePath:instancePath+"/source",parentData:data,parentDataProperty:"source",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
}
else {
const err7 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
validate74.errors = vErrors;
return errors === 0;
}
validate74.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema32 = {"description":"Letters, digits and hyphens.","type":"string","pattern":"^[A-Za-z][A-Za-z0-9-]*$","maxLength":60};
const pattern7 = new RegExp("^[A-Za-z][A-Za-z0-9-]*$", "u");

function validate84(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate84.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(typeof data === "string"){
if(func2(data) > 60){
const err0 = {instancePath,schemaPath:"#/maxLength",keyword:"maxLength",params:{limit: 60},message:"must NOT have more than 60 characters"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(!pattern7.test(data)){
const err1 = {instancePath,schemaPath:"#/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z][A-Za-z0-9-]*$"},message:"must match pattern \""+"^[A-Za-z][A-Za-z0-9-]*$"+"\""};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
else {
const err2 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
validate84.errors = vErrors;
return errors === 0;
}
validate84.evaluated = {"dynamicProps":false,"dynamicItems":false};

const schema33 = {"type":"object","properties":{"prerequisites":{"type":"array","items":{"$ref":"#/$defs/line"},"maxItems":20},"stopActions":{"type":"array","items":{"$ref":"#/$defs/line"},"minItems":1,"maxItems":3},"people":{"$ref":"#/$defs/line"},"throughout":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12}},"required":["prerequisites","stopActions","people","throughout"],"additionalProperties":false};
const schema34 = {"type":"object","properties":{"word":{"enum":["danger","warning","caution","notice"]},"text":{"$ref":"#/$defs/paragraph"}},"required":["word","text"],"additionalProperties":false};

function validate92(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate92.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.word === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "word"},message:"must have required property '"+"word"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.text === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "text"},message:"must have required property '"+"text"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "word") || (key0 === "text"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.word !== undefined){
let data0 = data.word;
if(!((((data0 === "danger") || (data0 === "warning")) || (data0 === "caution")) || (data0 === "notice"))){
const err3 = {instancePath:instancePath+"/word",schemaPath:"#/properties/word/enum",keyword:"enum",params:{allowedValues: schema34.properties.word.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
if(data.text !== undefined){
if(!(validate57(data.text, {instancePath:instancePath+"/text",parentData:data,parentDataProperty:"text",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
}
else {
const err4 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
validate92.errors = vErrors;
return errors === 0;
}
validate92.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};


function validate88(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate88.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.prerequisites === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "prerequisites"},message:"must have required property '"+"prerequisites"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.stopActions === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "stopActions"},message:"must have required property '"+"stopActions"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.people === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "people"},message:"must have required property '"+"people"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.throughout === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "throughout"},message:"must have required property '"+"throughout"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
for(const key0 in data){
if(!((((key0 === "prerequisites") || (key0 === "stopActions")) || (key0 === "people")) || (key0 === "throughout"))){
const err4 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
if(data.prerequisites !== undefined){
let data0 = data.prerequisites;
if(Array.isArray(data0)){
if(data0.length > 20){
const err5 = {instancePath:instancePath+"/prerequisites",schemaPath:"#/properties/prerequisites/maxItems",keyword:"maxItems",params:{limit: 20},message:"must NOT have more than 20 items"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
const len0 = data0.length;
for(let i0=0; i0<len0; i0++){
if(!(validate61(data0[i0], {instancePath:instancePath+"/prerequisites/" + i0,parentData:data0,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
}
else {
const err6 = {instancePath:instancePath+"/prerequisites",schemaPath:"#/properties/prerequisites/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
}
if(data.stopActions !== undefined){
let data2 = data.stopActions;
if(Array.isArray(data2)){
if(data2.length > 3){
const err7 = {instancePath:instancePath+"/stopActions",schemaPath:"#/properties/stopActions/maxItems",keyword:"maxItems",params:{limit: 3},message:"must NOT have more than 3 items"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
if(data2.length < 1){
const err8 = {instancePath:instancePath+"/stopActions",schemaPath:"#/properties/stopActions/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
const len1 = data2.length;
for(let i1=0; i1<len1; i1++){
if(!(validate61(data2[i1], {instancePath:instancePath+"/stopActions/" + i1,parentData:data2,parentDataProperty:i1,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
}
else {
const err9 = {instancePath:instancePath+"/stopActions",schemaPath:"#/properties/stopActions/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
if(data.people !== undefined){
if(!(validate61(data.people, {instancePath:instancePath+"/people",parentData:data,parentDataProperty:"people",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.throughout !== undefined){
let data5 = data.throughout;
if(Array.isArray(data5)){
if(data5.length > 12){
const err10 = {instancePath:instancePath+"/throughout",schemaPath:"#/properties/throughout/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
const len2 = data5.length;
for(let i2=0; i2<len2; i2++){
if(!(validate92(data5[i2], {instancePath:instancePath+"/throughout/" + i2,parentData:data5,parentDataProperty:i2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate92.errors : vErrors.concat(validate92.errors);
errors = vErrors.length;
}
}
}
else {
const err11 = {instancePath:instancePath+"/throughout",schemaPath:"#/properties/throughout/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
}
}
else {
const err12 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
validate88.errors = vErrors;
return errors === 0;
}
validate88.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema35 = {"type":"object","properties":{"id":{"$ref":"#/$defs/identifier"},"holds":{"$ref":"#/$defs/expression"},"of":{"type":"array","items":{"$ref":"#/$defs/name"},"minItems":1,"maxItems":50},"says":{"$ref":"#/$defs/line"},"then":{"$ref":"#/$defs/line"}},"required":["id","holds","of","says","then"],"additionalProperties":false};
const schema36 = {"description":"Text in the expression language.","type":"string","minLength":1,"maxLength":2000};

function validate98(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate98.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(typeof data === "string"){
if(func2(data) > 2000){
const err0 = {instancePath,schemaPath:"#/maxLength",keyword:"maxLength",params:{limit: 2000},message:"must NOT have more than 2000 characters"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(func2(data) < 1){
const err1 = {instancePath,schemaPath:"#/minLength",keyword:"minLength",params:{limit: 1},message:"must NOT have fewer than 1 characters"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
else {
const err2 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
validate98.errors = vErrors;
return errors === 0;
}
validate98.evaluated = {"dynamicProps":false,"dynamicItems":false};


function validate96(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate96.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.id === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.holds === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "holds"},message:"must have required property '"+"holds"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.of === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "of"},message:"must have required property '"+"of"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.says === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "says"},message:"must have required property '"+"says"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.then === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "then"},message:"must have required property '"+"then"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
for(const key0 in data){
if(!(((((key0 === "id") || (key0 === "holds")) || (key0 === "of")) || (key0 === "says")) || (key0 === "then"))){
const err5 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
if(data.id !== undefined){
if(!(validate84(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.holds !== undefined){
if(!(validate98(data.holds, {instancePath:instancePath+"/holds",parentData:data,parentDataProperty:"holds",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate98.errors : vErrors.concat(validate98.errors);
errors = vErrors.length;
}
}
if(data.of !== undefined){
let data2 = data.of;
if(Array.isArray(data2)){
if(data2.length > 50){
const err6 = {instancePath:instancePath+"/of",schemaPath:"#/properties/of/maxItems",keyword:"maxItems",params:{limit: 50},message:"must NOT have more than 50 items"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(data2.length < 1){
const err7 = {instancePath:instancePath+"/of",schemaPath:"#/properties/of/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
const len0 = data2.length;
for(let i0=0; i0<len0; i0++){
if(!(validate66(data2[i0], {instancePath:instancePath+"/of/" + i0,parentData:data2,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err8 = {instancePath:instancePath+"/of",schemaPath:"#/properties/of/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
}
if(data.says !== undefined){
if(!(validate61(data.says, {instancePath:instancePath+"/says",parentData:data,parentDataProperty:"says",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.then !== undefined){
if(!(validate61(data.then, {instancePath:instancePath+"/then",parentData:data,parentDataProperty:"then",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
}
else {
const err9 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
validate96.errors = vErrors;
return errors === 0;
}
validate96.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema37 = {"type":"object","properties":{"makeSafe":{"type":"array","items":{"$ref":"#/$defs/line"},"minItems":1,"maxItems":12},"exit":{"$ref":"#/$defs/exit"}},"required":["makeSafe","exit"],"additionalProperties":false};
const schema38 = {"type":"object","properties":{"to":{"description":"A step's id, or `verdict`.","type":"string","pattern":"^[A-Za-z][A-Za-z0-9-]*$","maxLength":60},"because":{"$ref":"#/$defs/line"},"verdict":{"$ref":"#/$defs/name"}},"required":["to","because"],"additionalProperties":false};

function validate106(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate106.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.to === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "to"},message:"must have required property '"+"to"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.because === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "because"},message:"must have required property '"+"because"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!(((key0 === "to") || (key0 === "because")) || (key0 === "verdict"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.to !== undefined){
let data0 = data.to;
if(typeof data0 === "string"){
if(func2(data0) > 60){
const err3 = {instancePath:instancePath+"/to",schemaPath:"#/properties/to/maxLength",keyword:"maxLength",params:{limit: 60},message:"must NOT have more than 60 characters"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(!pattern7.test(data0)){
const err4 = {instancePath:instancePath+"/to",schemaPath:"#/properties/to/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z][A-Za-z0-9-]*$"},message:"must match pattern \""+"^[A-Za-z][A-Za-z0-9-]*$"+"\""};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
else {
const err5 = {instancePath:instancePath+"/to",schemaPath:"#/properties/to/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
if(data.because !== undefined){
if(!(validate61(data.because, {instancePath:instancePath+"/because",parentData:data,parentDataProperty:"because",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.verdict !== undefined){
if(!(validate66(data.verdict, {instancePath:instancePath+"/verdict",parentData:data,parentDataProperty:"verdict",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err6 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
validate106.errors = vErrors;
return errors === 0;
}
validate106.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};


function validate104(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate104.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.makeSafe === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "makeSafe"},message:"must have required property '"+"makeSafe"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.exit === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "exit"},message:"must have required property '"+"exit"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "makeSafe") || (key0 === "exit"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.makeSafe !== undefined){
let data0 = data.makeSafe;
if(Array.isArray(data0)){
if(data0.length > 12){
const err3 = {instancePath:instancePath+"/makeSafe",schemaPath:"#/properties/makeSafe/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data0.length < 1){
const err4 = {instancePath:instancePath+"/makeSafe",schemaPath:"#/properties/makeSafe/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
const len0 = data0.length;
for(let i0=0; i0<len0; i0++){
if(!(validate61(data0[i0], {instancePath:instancePath+"/makeSafe/" + i0,parentData:data0,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
}
else {
const err5 = {instancePath:instancePath+"/makeSafe",schemaPath:"#/properties/makeSafe/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
if(data.exit !== undefined){
if(!(validate106(data.exit, {instancePath:instancePath+"/exit",parentData:data,parentDataProperty:"exit",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
}
else {
const err6 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
validate104.errors = vErrors;
return errors === 0;
}
validate104.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema39 = {"type":"object","discriminator":{"propertyName":"kind"},"required":["kind"],"oneOf":[{"$ref":"#/$defs/startStep"},{"$ref":"#/$defs/actionStep"},{"$ref":"#/$defs/readingStep"},{"$ref":"#/$defs/choiceStep"},{"$ref":"#/$defs/listenStep"},{"$ref":"#/$defs/holdStep"},{"$ref":"#/$defs/waitStep"},{"$ref":"#/$defs/codesStep"},{"$ref":"#/$defs/driveStep"},{"$ref":"#/$defs/computeStep"},{"$ref":"#/$defs/restoreStep"},{"$ref":"#/$defs/findingStep"},{"$ref":"#/$defs/rampStep"},{"$ref":"#/$defs/photoStep"},{"$ref":"#/$defs/callStep"}]};
const schema40 = {"type":"object","properties":{"kind":{"const":"start"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30}},"required":["id","number","title","action","kind","otherwise"],"additionalProperties":false};
const schema41 = {"type":"object","properties":{"sheet":{"$ref":"#/$defs/identifier"},"marks":{"type":"array","items":{"$ref":"#/$defs/identifier"},"maxItems":30},"labels":{"type":"object","propertyNames":{"pattern":"^[A-Za-z][A-Za-z0-9-]*$","maxLength":60},"maxProperties":30,"additionalProperties":{"$ref":"#/$defs/label"}}},"required":["sheet","marks"],"additionalProperties":false};

function validate120(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate120.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.sheet === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "sheet"},message:"must have required property '"+"sheet"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.marks === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "marks"},message:"must have required property '"+"marks"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!(((key0 === "sheet") || (key0 === "marks")) || (key0 === "labels"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.sheet !== undefined){
if(!(validate84(data.sheet, {instancePath:instancePath+"/sheet",parentData:data,parentDataProperty:"sheet",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.marks !== undefined){
let data1 = data.marks;
if(Array.isArray(data1)){
if(data1.length > 30){
const err3 = {instancePath:instancePath+"/marks",schemaPath:"#/properties/marks/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
const len0 = data1.length;
for(let i0=0; i0<len0; i0++){
if(!(validate84(data1[i0], {instancePath:instancePath+"/marks/" + i0,parentData:data1,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
}
else {
const err4 = {instancePath:instancePath+"/marks",schemaPath:"#/properties/marks/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
if(data.labels !== undefined){
let data3 = data.labels;
if(data3 && typeof data3 == "object" && !Array.isArray(data3)){
if(Object.keys(data3).length > 30){
const err5 = {instancePath:instancePath+"/labels",schemaPath:"#/properties/labels/maxProperties",keyword:"maxProperties",params:{limit: 30},message:"must NOT have more than 30 properties"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
for(const key1 in data3){
const _errs8 = errors;
if(typeof key1 === "string"){
if(func2(key1) > 60){
const err6 = {instancePath:instancePath+"/labels",schemaPath:"#/properties/labels/propertyNames/maxLength",keyword:"maxLength",params:{limit: 60},message:"must NOT have more than 60 characters",propertyName:key1};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(!pattern7.test(key1)){
const err7 = {instancePath:instancePath+"/labels",schemaPath:"#/properties/labels/propertyNames/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z][A-Za-z0-9-]*$"},message:"must match pattern \""+"^[A-Za-z][A-Za-z0-9-]*$"+"\"",propertyName:key1};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
}
var valid3 = _errs8 === errors;
if(!valid3){
const err8 = {instancePath:instancePath+"/labels",schemaPath:"#/properties/labels/propertyNames",keyword:"propertyNames",params:{propertyName: key1},message:"property name must be valid"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
}
for(const key2 in data3){
if(!(validate55(data3[key2], {instancePath:instancePath+"/labels/" + key2.replace(/~/g, "~0").replace(/\//g, "~1"),parentData:data3,parentDataProperty:key2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
}
else {
const err9 = {instancePath:instancePath+"/labels",schemaPath:"#/properties/labels/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
}
else {
const err10 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
validate120.errors = vErrors;
return errors === 0;
}
validate120.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema42 = {"type":"object","properties":{"item":{"$ref":"#/$defs/identifier"},"label":{"$ref":"#/$defs/label"},"restore":{"$ref":"#/$defs/line"}},"required":["item","label","restore"],"additionalProperties":false};

function validate125(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate125.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.item === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "item"},message:"must have required property '"+"item"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.label === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "label"},message:"must have required property '"+"label"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.restore === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "restore"},message:"must have required property '"+"restore"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
for(const key0 in data){
if(!(((key0 === "item") || (key0 === "label")) || (key0 === "restore"))){
const err3 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
if(data.item !== undefined){
if(!(validate84(data.item, {instancePath:instancePath+"/item",parentData:data,parentDataProperty:"item",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.label !== undefined){
if(!(validate55(data.label, {instancePath:instancePath+"/label",parentData:data,parentDataProperty:"label",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.restore !== undefined){
if(!(validate61(data.restore, {instancePath:instancePath+"/restore",parentData:data,parentDataProperty:"restore",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
}
else {
const err4 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
validate125.errors = vErrors;
return errors === 0;
}
validate125.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema43 = {"type":"object","properties":{"by":{"enum":["lead","manager"]},"evidence":{"$ref":"#/$defs/line"}},"required":["by","evidence"],"additionalProperties":false};

function validate130(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate130.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.by === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "by"},message:"must have required property '"+"by"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.evidence === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "evidence"},message:"must have required property '"+"evidence"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "by") || (key0 === "evidence"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.by !== undefined){
let data0 = data.by;
if(!((data0 === "lead") || (data0 === "manager"))){
const err3 = {instancePath:instancePath+"/by",schemaPath:"#/properties/by/enum",keyword:"enum",params:{allowedValues: schema43.properties.by.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
if(data.evidence !== undefined){
if(!(validate61(data.evidence, {instancePath:instancePath+"/evidence",parentData:data,parentDataProperty:"evidence",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
}
else {
const err4 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
validate130.errors = vErrors;
return errors === 0;
}
validate130.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema44 = {"type":"object","properties":{"how":{"enum":["independent","concurrent"]},"what":{"$ref":"#/$defs/line"}},"required":["how","what"],"additionalProperties":false};

function validate133(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate133.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.how === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "how"},message:"must have required property '"+"how"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.what === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "what"},message:"must have required property '"+"what"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "how") || (key0 === "what"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.how !== undefined){
let data0 = data.how;
if(!((data0 === "independent") || (data0 === "concurrent"))){
const err3 = {instancePath:instancePath+"/how",schemaPath:"#/properties/how/enum",keyword:"enum",params:{allowedValues: schema44.properties.how.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
if(data.what !== undefined){
if(!(validate61(data.what, {instancePath:instancePath+"/what",parentData:data,parentDataProperty:"what",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
}
else {
const err4 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
validate133.errors = vErrors;
return errors === 0;
}
validate133.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema45 = {"type":"object","properties":{"to":{"description":"A step's id, or `verdict`.","type":"string","pattern":"^[A-Za-z][A-Za-z0-9-]*$","maxLength":60},"because":{"$ref":"#/$defs/line"},"verdict":{"$ref":"#/$defs/name"},"when":{"$ref":"#/$defs/expression"},"atMost":{"type":"integer","minimum":1,"maximum":20},"thenceforth":{"$ref":"#/$defs/exit"}},"required":["to","because","when"],"dependentRequired":{"atMost":["thenceforth"],"thenceforth":["atMost"]},"additionalProperties":false};

function validate136(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate136.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.to === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "to"},message:"must have required property '"+"to"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.because === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "because"},message:"must have required property '"+"because"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.when === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "when"},message:"must have required property '"+"when"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
for(const key0 in data){
if(!((((((key0 === "to") || (key0 === "because")) || (key0 === "verdict")) || (key0 === "when")) || (key0 === "atMost")) || (key0 === "thenceforth"))){
const err3 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
if(data.to !== undefined){
let data0 = data.to;
if(typeof data0 === "string"){
if(func2(data0) > 60){
const err4 = {instancePath:instancePath+"/to",schemaPath:"#/properties/to/maxLength",keyword:"maxLength",params:{limit: 60},message:"must NOT have more than 60 characters"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(!pattern7.test(data0)){
const err5 = {instancePath:instancePath+"/to",schemaPath:"#/properties/to/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z][A-Za-z0-9-]*$"},message:"must match pattern \""+"^[A-Za-z][A-Za-z0-9-]*$"+"\""};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
else {
const err6 = {instancePath:instancePath+"/to",schemaPath:"#/properties/to/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
}
if(data.because !== undefined){
if(!(validate61(data.because, {instancePath:instancePath+"/because",parentData:data,parentDataProperty:"because",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.verdict !== undefined){
if(!(validate66(data.verdict, {instancePath:instancePath+"/verdict",parentData:data,parentDataProperty:"verdict",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.when !== undefined){
if(!(validate98(data.when, {instancePath:instancePath+"/when",parentData:data,parentDataProperty:"when",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate98.errors : vErrors.concat(validate98.errors);
errors = vErrors.length;
}
}
if(data.atMost !== undefined){
let data4 = data.atMost;
if(!(((typeof data4 == "number") && (!(data4 % 1) && !isNaN(data4))) && (isFinite(data4)))){
const err7 = {instancePath:instancePath+"/atMost",schemaPath:"#/properties/atMost/type",keyword:"type",params:{type: "integer"},message:"must be integer"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
if((typeof data4 == "number") && (isFinite(data4))){
if(data4 > 20 || isNaN(data4)){
const err8 = {instancePath:instancePath+"/atMost",schemaPath:"#/properties/atMost/maximum",keyword:"maximum",params:{comparison: "<=", limit: 20},message:"must be <= 20"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
if(data4 < 1 || isNaN(data4)){
const err9 = {instancePath:instancePath+"/atMost",schemaPath:"#/properties/atMost/minimum",keyword:"minimum",params:{comparison: ">=", limit: 1},message:"must be >= 1"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
}
if(data.thenceforth !== undefined){
if(!(validate106(data.thenceforth, {instancePath:instancePath+"/thenceforth",parentData:data,parentDataProperty:"thenceforth",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
if(data.atMost !== undefined){
if(data.thenceforth === undefined){
const err10 = {instancePath,schemaPath:"#/dependentRequired",keyword:"dependentRequired",params:{property: "atMost",
    missingProperty: "thenceforth",
    depsCount: 1,
    deps: "thenceforth"},message:"must have property thenceforth when property atMost is present"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
if(data.thenceforth !== undefined){
if(data.atMost === undefined){
const err11 = {instancePath,schemaPath:"#/dependentRequired",keyword:"dependentRequired",params:{property: "thenceforth",
    missingProperty: "atMost",
    depsCount: 1,
    deps: "atMost"},message:"must have property atMost when property thenceforth is present"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
}
}
else {
const err12 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
validate136.errors = vErrors;
return errors === 0;
}
validate136.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema46 = {"type":"object","properties":{"name":{"$ref":"#/$defs/name"},"label":{"$ref":"#/$defs/label"},"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"},"band":{"$ref":"#/$defs/band"},"is":{"$ref":"#/$defs/expression"}},"required":["name","label","unit","is"],"additionalProperties":false};
const schema47 = {"type":"object","properties":{"low":{"$ref":"#/$defs/expression"},"high":{"$ref":"#/$defs/expression"},"when":{"$ref":"#/$defs/expression"},"unjudged":{"$ref":"#/$defs/line"},"source":{"$ref":"#/$defs/line"}},"required":["source"],"anyOf":[{"required":["low"]},{"required":["high"]}],"additionalProperties":false};

function validate148(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate148.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
const _errs1 = errors;
let valid0 = false;
const _errs2 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.low === undefined){
const err0 = {instancePath,schemaPath:"#/anyOf/0/required",keyword:"required",params:{missingProperty: "low"},message:"must have required property '"+"low"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
}
var _valid0 = _errs2 === errors;
valid0 = valid0 || _valid0;
const _errs3 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.high === undefined){
const err1 = {instancePath,schemaPath:"#/anyOf/1/required",keyword:"required",params:{missingProperty: "high"},message:"must have required property '"+"high"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
var _valid0 = _errs3 === errors;
valid0 = valid0 || _valid0;
if(!valid0){
const err2 = {instancePath,schemaPath:"#/anyOf",keyword:"anyOf",params:{},message:"must match a schema in anyOf"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
else {
errors = _errs1;
if(vErrors !== null){
if(_errs1){
vErrors.length = _errs1;
}
else {
vErrors = null;
}
}
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.source === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "source"},message:"must have required property '"+"source"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
for(const key0 in data){
if(!(((((key0 === "low") || (key0 === "high")) || (key0 === "when")) || (key0 === "unjudged")) || (key0 === "source"))){
const err4 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
if(data.low !== undefined){
if(!(validate98(data.low, {instancePath:instancePath+"/low",parentData:data,parentDataProperty:"low",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate98.errors : vErrors.concat(validate98.errors);
errors = vErrors.length;
}
}
if(data.high !== undefined){
if(!(validate98(data.high, {instancePath:instancePath+"/high",parentData:data,parentDataProperty:"high",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate98.errors : vErrors.concat(validate98.errors);
errors = vErrors.length;
}
}
if(data.when !== undefined){
if(!(validate98(data.when, {instancePath:instancePath+"/when",parentData:data,parentDataProperty:"when",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate98.errors : vErrors.concat(validate98.errors);
errors = vErrors.length;
}
}
if(data.unjudged !== undefined){
if(!(validate61(data.unjudged, {instancePath:instancePath+"/unjudged",parentData:data,parentDataProperty:"unjudged",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.source !== undefined){
if(!(validate61(data.source, {instancePath:instancePath+"/source",parentData:data,parentDataProperty:"source",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
}
else {
const err5 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
validate148.errors = vErrors;
return errors === 0;
}
validate148.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};


function validate143(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate143.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.name === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.label === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "label"},message:"must have required property '"+"label"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.unit === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "unit"},message:"must have required property '"+"unit"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.is === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "is"},message:"must have required property '"+"is"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
for(const key0 in data){
if(!((((((key0 === "name") || (key0 === "label")) || (key0 === "unit")) || (key0 === "sense")) || (key0 === "band")) || (key0 === "is"))){
const err4 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
if(data.name !== undefined){
if(!(validate66(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.label !== undefined){
if(!(validate55(data.label, {instancePath:instancePath+"/label",parentData:data,parentDataProperty:"label",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.unit !== undefined){
if(!(validate71(data.unit, {instancePath:instancePath+"/unit",parentData:data,parentDataProperty:"unit",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate71.errors : vErrors.concat(validate71.errors);
errors = vErrors.length;
}
}
if(data.sense !== undefined){
if(!(validate78(data.sense, {instancePath:instancePath+"/sense",parentData:data,parentDataProperty:"sense",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate78.errors : vErrors.concat(validate78.errors);
errors = vErrors.length;
}
}
if(data.band !== undefined){
if(!(validate148(data.band, {instancePath:instancePath+"/band",parentData:data,parentDataProperty:"band",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate148.errors : vErrors.concat(validate148.errors);
errors = vErrors.length;
}
}
if(data.is !== undefined){
if(!(validate98(data.is, {instancePath:instancePath+"/is",parentData:data,parentDataProperty:"is",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate98.errors : vErrors.concat(validate98.errors);
errors = vErrors.length;
}
}
}
else {
const err5 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
validate143.errors = vErrors;
return errors === 0;
}
validate143.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const pattern9 = new RegExp("^[A-Za-z0-9]+$", "u");

function validate112(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate112.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.id === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.number === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "number"},message:"must have required property '"+"number"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.title === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "title"},message:"must have required property '"+"title"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.action === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "action"},message:"must have required property '"+"action"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.kind === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "kind"},message:"must have required property '"+"kind"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(data.otherwise === undefined){
const err5 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "otherwise"},message:"must have required property '"+"otherwise"+"'"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
for(const key0 in data){
if(!(func1.call(schema40.properties, key0))){
const err6 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
}
if(data.kind !== undefined){
if("start" !== data.kind){
const err7 = {instancePath:instancePath+"/kind",schemaPath:"#/properties/kind/const",keyword:"const",params:{allowedValue: "start"},message:"must be equal to constant"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
}
if(data.id !== undefined){
if(!(validate84(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.number !== undefined){
let data2 = data.number;
if(typeof data2 === "string"){
if(func2(data2) > 8){
const err8 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/maxLength",keyword:"maxLength",params:{limit: 8},message:"must NOT have more than 8 characters"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
if(!pattern9.test(data2)){
const err9 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z0-9]+$"},message:"must match pattern \""+"^[A-Za-z0-9]+$"+"\""};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
else {
const err10 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
if(data.title !== undefined){
if(!(validate55(data.title, {instancePath:instancePath+"/title",parentData:data,parentDataProperty:"title",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.action !== undefined){
if(!(validate61(data.action, {instancePath:instancePath+"/action",parentData:data,parentDataProperty:"action",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.short !== undefined){
if(!(validate55(data.short, {instancePath:instancePath+"/short",parentData:data,parentDataProperty:"short",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.notes !== undefined){
let data6 = data.notes;
if(Array.isArray(data6)){
if(data6.length > 10){
const err11 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/maxItems",keyword:"maxItems",params:{limit: 10},message:"must NOT have more than 10 items"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
if(data6.length < 1){
const err12 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
const len0 = data6.length;
for(let i0=0; i0<len0; i0++){
if(!(validate57(data6[i0], {instancePath:instancePath+"/notes/" + i0,parentData:data6,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
}
else {
const err13 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
}
if(data.why !== undefined){
if(!(validate57(data.why, {instancePath:instancePath+"/why",parentData:data,parentDataProperty:"why",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.cautions !== undefined){
let data9 = data.cautions;
if(Array.isArray(data9)){
if(data9.length > 12){
const err14 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err14];
}
else {
vErrors.push(err14);
}
errors++;
}
const len1 = data9.length;
for(let i1=0; i1<len1; i1++){
if(!(validate92(data9[i1], {instancePath:instancePath+"/cautions/" + i1,parentData:data9,parentDataProperty:i1,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate92.errors : vErrors.concat(validate92.errors);
errors = vErrors.length;
}
}
}
else {
const err15 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err15];
}
else {
vErrors.push(err15);
}
errors++;
}
}
if(data.picture !== undefined){
if(!(validate120(data.picture, {instancePath:instancePath+"/picture",parentData:data,parentDataProperty:"picture",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate120.errors : vErrors.concat(validate120.errors);
errors = vErrors.length;
}
}
if(data.disturbs !== undefined){
let data12 = data.disturbs;
if(Array.isArray(data12)){
if(data12.length > 12){
const err16 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err16];
}
else {
vErrors.push(err16);
}
errors++;
}
if(data12.length < 1){
const err17 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err17];
}
else {
vErrors.push(err17);
}
errors++;
}
const len2 = data12.length;
for(let i2=0; i2<len2; i2++){
if(!(validate125(data12[i2], {instancePath:instancePath+"/disturbs/" + i2,parentData:data12,parentDataProperty:i2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate125.errors : vErrors.concat(validate125.errors);
errors = vErrors.length;
}
}
}
else {
const err18 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err18];
}
else {
vErrors.push(err18);
}
errors++;
}
}
if(data.stay !== undefined){
if(typeof data.stay !== "boolean"){
const err19 = {instancePath:instancePath+"/stay",schemaPath:"#/properties/stay/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err19];
}
else {
vErrors.push(err19);
}
errors++;
}
}
if(data.release !== undefined){
if(!(validate130(data.release, {instancePath:instancePath+"/release",parentData:data,parentDataProperty:"release",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate130.errors : vErrors.concat(validate130.errors);
errors = vErrors.length;
}
}
if(data.verify !== undefined){
if(!(validate133(data.verify, {instancePath:instancePath+"/verify",parentData:data,parentDataProperty:"verify",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate133.errors : vErrors.concat(validate133.errors);
errors = vErrors.length;
}
}
if(data.next !== undefined){
let data17 = data.next;
if(Array.isArray(data17)){
if(data17.length > 30){
const err20 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err20];
}
else {
vErrors.push(err20);
}
errors++;
}
const len3 = data17.length;
for(let i3=0; i3<len3; i3++){
if(!(validate136(data17[i3], {instancePath:instancePath+"/next/" + i3,parentData:data17,parentDataProperty:i3,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate136.errors : vErrors.concat(validate136.errors);
errors = vErrors.length;
}
}
}
else {
const err21 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err21];
}
else {
vErrors.push(err21);
}
errors++;
}
}
if(data.otherwise !== undefined){
if(!(validate106(data.otherwise, {instancePath:instancePath+"/otherwise",parentData:data,parentDataProperty:"otherwise",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
if(data.results !== undefined){
let data20 = data.results;
if(Array.isArray(data20)){
if(data20.length > 30){
const err22 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err22];
}
else {
vErrors.push(err22);
}
errors++;
}
const len4 = data20.length;
for(let i4=0; i4<len4; i4++){
if(!(validate143(data20[i4], {instancePath:instancePath+"/results/" + i4,parentData:data20,parentDataProperty:i4,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate143.errors : vErrors.concat(validate143.errors);
errors = vErrors.length;
}
}
}
else {
const err23 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err23];
}
else {
vErrors.push(err23);
}
errors++;
}
}
}
else {
const err24 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err24];
}
else {
vErrors.push(err24);
}
errors++;
}
validate112.errors = vErrors;
return errors === 0;
}
validate112.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema48 = {"type":"object","properties":{"kind":{"const":"action"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30}},"required":["id","number","title","action","kind","otherwise"],"additionalProperties":false};

function validate157(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate157.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.id === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.number === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "number"},message:"must have required property '"+"number"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.title === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "title"},message:"must have required property '"+"title"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.action === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "action"},message:"must have required property '"+"action"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.kind === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "kind"},message:"must have required property '"+"kind"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(data.otherwise === undefined){
const err5 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "otherwise"},message:"must have required property '"+"otherwise"+"'"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
for(const key0 in data){
if(!(func1.call(schema48.properties, key0))){
const err6 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
}
if(data.kind !== undefined){
if("action" !== data.kind){
const err7 = {instancePath:instancePath+"/kind",schemaPath:"#/properties/kind/const",keyword:"const",params:{allowedValue: "action"},message:"must be equal to constant"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
}
if(data.id !== undefined){
if(!(validate84(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.number !== undefined){
let data2 = data.number;
if(typeof data2 === "string"){
if(func2(data2) > 8){
const err8 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/maxLength",keyword:"maxLength",params:{limit: 8},message:"must NOT have more than 8 characters"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
if(!pattern9.test(data2)){
const err9 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z0-9]+$"},message:"must match pattern \""+"^[A-Za-z0-9]+$"+"\""};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
else {
const err10 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
if(data.title !== undefined){
if(!(validate55(data.title, {instancePath:instancePath+"/title",parentData:data,parentDataProperty:"title",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.action !== undefined){
if(!(validate61(data.action, {instancePath:instancePath+"/action",parentData:data,parentDataProperty:"action",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.short !== undefined){
if(!(validate55(data.short, {instancePath:instancePath+"/short",parentData:data,parentDataProperty:"short",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.notes !== undefined){
let data6 = data.notes;
if(Array.isArray(data6)){
if(data6.length > 10){
const err11 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/maxItems",keyword:"maxItems",params:{limit: 10},message:"must NOT have more than 10 items"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
if(data6.length < 1){
const err12 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
const len0 = data6.length;
for(let i0=0; i0<len0; i0++){
if(!(validate57(data6[i0], {instancePath:instancePath+"/notes/" + i0,parentData:data6,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
}
else {
const err13 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
}
if(data.why !== undefined){
if(!(validate57(data.why, {instancePath:instancePath+"/why",parentData:data,parentDataProperty:"why",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.cautions !== undefined){
let data9 = data.cautions;
if(Array.isArray(data9)){
if(data9.length > 12){
const err14 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err14];
}
else {
vErrors.push(err14);
}
errors++;
}
const len1 = data9.length;
for(let i1=0; i1<len1; i1++){
if(!(validate92(data9[i1], {instancePath:instancePath+"/cautions/" + i1,parentData:data9,parentDataProperty:i1,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate92.errors : vErrors.concat(validate92.errors);
errors = vErrors.length;
}
}
}
else {
const err15 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err15];
}
else {
vErrors.push(err15);
}
errors++;
}
}
if(data.picture !== undefined){
if(!(validate120(data.picture, {instancePath:instancePath+"/picture",parentData:data,parentDataProperty:"picture",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate120.errors : vErrors.concat(validate120.errors);
errors = vErrors.length;
}
}
if(data.disturbs !== undefined){
let data12 = data.disturbs;
if(Array.isArray(data12)){
if(data12.length > 12){
const err16 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err16];
}
else {
vErrors.push(err16);
}
errors++;
}
if(data12.length < 1){
const err17 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err17];
}
else {
vErrors.push(err17);
}
errors++;
}
const len2 = data12.length;
for(let i2=0; i2<len2; i2++){
if(!(validate125(data12[i2], {instancePath:instancePath+"/disturbs/" + i2,parentData:data12,parentDataProperty:i2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate125.errors : vErrors.concat(validate125.errors);
errors = vErrors.length;
}
}
}
else {
const err18 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err18];
}
else {
vErrors.push(err18);
}
errors++;
}
}
if(data.stay !== undefined){
if(typeof data.stay !== "boolean"){
const err19 = {instancePath:instancePath+"/stay",schemaPath:"#/properties/stay/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err19];
}
else {
vErrors.push(err19);
}
errors++;
}
}
if(data.release !== undefined){
if(!(validate130(data.release, {instancePath:instancePath+"/release",parentData:data,parentDataProperty:"release",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate130.errors : vErrors.concat(validate130.errors);
errors = vErrors.length;
}
}
if(data.verify !== undefined){
if(!(validate133(data.verify, {instancePath:instancePath+"/verify",parentData:data,parentDataProperty:"verify",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate133.errors : vErrors.concat(validate133.errors);
errors = vErrors.length;
}
}
if(data.next !== undefined){
let data17 = data.next;
if(Array.isArray(data17)){
if(data17.length > 30){
const err20 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err20];
}
else {
vErrors.push(err20);
}
errors++;
}
const len3 = data17.length;
for(let i3=0; i3<len3; i3++){
if(!(validate136(data17[i3], {instancePath:instancePath+"/next/" + i3,parentData:data17,parentDataProperty:i3,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate136.errors : vErrors.concat(validate136.errors);
errors = vErrors.length;
}
}
}
else {
const err21 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err21];
}
else {
vErrors.push(err21);
}
errors++;
}
}
if(data.otherwise !== undefined){
if(!(validate106(data.otherwise, {instancePath:instancePath+"/otherwise",parentData:data,parentDataProperty:"otherwise",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
if(data.results !== undefined){
let data20 = data.results;
if(Array.isArray(data20)){
if(data20.length > 30){
const err22 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err22];
}
else {
vErrors.push(err22);
}
errors++;
}
const len4 = data20.length;
for(let i4=0; i4<len4; i4++){
if(!(validate143(data20[i4], {instancePath:instancePath+"/results/" + i4,parentData:data20,parentDataProperty:i4,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate143.errors : vErrors.concat(validate143.errors);
errors = vErrors.length;
}
}
}
else {
const err23 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err23];
}
else {
vErrors.push(err23);
}
errors++;
}
}
}
else {
const err24 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err24];
}
else {
vErrors.push(err24);
}
errors++;
}
validate157.errors = vErrors;
return errors === 0;
}
validate157.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema49 = {"type":"object","properties":{"kind":{"const":"reading"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"reads":{"type":"array","items":{"$ref":"#/$defs/readQuantity"},"minItems":1,"maxItems":20},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"cannotMeasure":{"$ref":"#/$defs/exit"}},"required":["id","number","title","action","kind","otherwise","cannotMeasure","reads"],"additionalProperties":false};
const schema50 = {"type":"object","properties":{"name":{"$ref":"#/$defs/name"},"label":{"$ref":"#/$defs/label"},"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"},"band":{"$ref":"#/$defs/band"},"gear":{"$ref":"#/$defs/name"},"plausible":{"$ref":"#/$defs/range"},"takes":{"type":"integer","minimum":1,"maximum":5},"ways":{"type":"array","items":{"$ref":"#/$defs/entryWay"},"minItems":1,"maxItems":10},"validity":{"$ref":"#/$defs/validity"}},"required":["name","label","unit","plausible"],"additionalProperties":false};
const schema51 = {"type":"object","properties":{"low":{"type":"number"},"high":{"type":"number"}},"required":["low","high"],"additionalProperties":false};

function validate191(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate191.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.low === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "low"},message:"must have required property '"+"low"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.high === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "high"},message:"must have required property '"+"high"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "low") || (key0 === "high"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.low !== undefined){
let data0 = data.low;
if(!((typeof data0 == "number") && (isFinite(data0)))){
const err3 = {instancePath:instancePath+"/low",schemaPath:"#/properties/low/type",keyword:"type",params:{type: "number"},message:"must be number"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
if(data.high !== undefined){
let data1 = data.high;
if(!((typeof data1 == "number") && (isFinite(data1)))){
const err4 = {instancePath:instancePath+"/high",schemaPath:"#/properties/high/type",keyword:"type",params:{type: "number"},message:"must be number"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
}
else {
const err5 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
validate191.errors = vErrors;
return errors === 0;
}
validate191.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema52 = {"type":"object","properties":{"id":{"$ref":"#/$defs/identifier"},"label":{"$ref":"#/$defs/label"},"hint":{"$ref":"#/$defs/line"},"entry":{"$ref":"#/$defs/entry"},"is":{"$ref":"#/$defs/expression"},"uncertainty":{"$ref":"#/$defs/expression"}},"required":["id","label","hint","is"],"additionalProperties":false};
const schema53 = {"type":"object","properties":{"name":{"$ref":"#/$defs/name"},"label":{"$ref":"#/$defs/label"},"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"},"plausible":{"$ref":"#/$defs/range"},"gear":{"$ref":"#/$defs/name"}},"required":["name","label","unit","plausible"],"additionalProperties":false};

function validate197(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate197.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.name === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.label === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "label"},message:"must have required property '"+"label"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.unit === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "unit"},message:"must have required property '"+"unit"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.plausible === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "plausible"},message:"must have required property '"+"plausible"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
for(const key0 in data){
if(!((((((key0 === "name") || (key0 === "label")) || (key0 === "unit")) || (key0 === "sense")) || (key0 === "plausible")) || (key0 === "gear"))){
const err4 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
if(data.name !== undefined){
if(!(validate66(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.label !== undefined){
if(!(validate55(data.label, {instancePath:instancePath+"/label",parentData:data,parentDataProperty:"label",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.unit !== undefined){
if(!(validate71(data.unit, {instancePath:instancePath+"/unit",parentData:data,parentDataProperty:"unit",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate71.errors : vErrors.concat(validate71.errors);
errors = vErrors.length;
}
}
if(data.sense !== undefined){
if(!(validate78(data.sense, {instancePath:instancePath+"/sense",parentData:data,parentDataProperty:"sense",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate78.errors : vErrors.concat(validate78.errors);
errors = vErrors.length;
}
}
if(data.plausible !== undefined){
if(!(validate191(data.plausible, {instancePath:instancePath+"/plausible",parentData:data,parentDataProperty:"plausible",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate191.errors : vErrors.concat(validate191.errors);
errors = vErrors.length;
}
}
if(data.gear !== undefined){
if(!(validate66(data.gear, {instancePath:instancePath+"/gear",parentData:data,parentDataProperty:"gear",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err5 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
validate197.errors = vErrors;
return errors === 0;
}
validate197.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};


function validate193(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate193.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.id === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.label === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "label"},message:"must have required property '"+"label"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.hint === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "hint"},message:"must have required property '"+"hint"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.is === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "is"},message:"must have required property '"+"is"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
for(const key0 in data){
if(!((((((key0 === "id") || (key0 === "label")) || (key0 === "hint")) || (key0 === "entry")) || (key0 === "is")) || (key0 === "uncertainty"))){
const err4 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
if(data.id !== undefined){
if(!(validate84(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.label !== undefined){
if(!(validate55(data.label, {instancePath:instancePath+"/label",parentData:data,parentDataProperty:"label",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.hint !== undefined){
if(!(validate61(data.hint, {instancePath:instancePath+"/hint",parentData:data,parentDataProperty:"hint",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.entry !== undefined){
if(!(validate197(data.entry, {instancePath:instancePath+"/entry",parentData:data,parentDataProperty:"entry",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate197.errors : vErrors.concat(validate197.errors);
errors = vErrors.length;
}
}
if(data.is !== undefined){
if(!(validate98(data.is, {instancePath:instancePath+"/is",parentData:data,parentDataProperty:"is",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate98.errors : vErrors.concat(validate98.errors);
errors = vErrors.length;
}
}
if(data.uncertainty !== undefined){
if(!(validate98(data.uncertainty, {instancePath:instancePath+"/uncertainty",parentData:data,parentDataProperty:"uncertainty",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate98.errors : vErrors.concat(validate98.errors);
errors = vErrors.length;
}
}
}
else {
const err5 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
validate193.errors = vErrors;
return errors === 0;
}
validate193.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema54 = {"type":"object","description":"Ends after minutes, or when one of the steps is done.","properties":{"minutes":{"type":"number","exclusiveMinimum":0,"maximum":1440},"until":{"type":"array","items":{"$ref":"#/$defs/identifier"},"minItems":1,"maxItems":30},"because":{"$ref":"#/$defs/line"}},"required":["because"],"anyOf":[{"required":["minutes"]},{"required":["until"]}],"additionalProperties":false};

function validate208(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate208.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
const _errs1 = errors;
let valid0 = false;
const _errs2 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.minutes === undefined){
const err0 = {instancePath,schemaPath:"#/anyOf/0/required",keyword:"required",params:{missingProperty: "minutes"},message:"must have required property '"+"minutes"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
}
var _valid0 = _errs2 === errors;
valid0 = valid0 || _valid0;
const _errs3 = errors;
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.until === undefined){
const err1 = {instancePath,schemaPath:"#/anyOf/1/required",keyword:"required",params:{missingProperty: "until"},message:"must have required property '"+"until"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
var _valid0 = _errs3 === errors;
valid0 = valid0 || _valid0;
if(!valid0){
const err2 = {instancePath,schemaPath:"#/anyOf",keyword:"anyOf",params:{},message:"must match a schema in anyOf"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
else {
errors = _errs1;
if(vErrors !== null){
if(_errs1){
vErrors.length = _errs1;
}
else {
vErrors = null;
}
}
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.because === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "because"},message:"must have required property '"+"because"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
for(const key0 in data){
if(!(((key0 === "minutes") || (key0 === "until")) || (key0 === "because"))){
const err4 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
if(data.minutes !== undefined){
let data0 = data.minutes;
if((typeof data0 == "number") && (isFinite(data0))){
if(data0 > 1440 || isNaN(data0)){
const err5 = {instancePath:instancePath+"/minutes",schemaPath:"#/properties/minutes/maximum",keyword:"maximum",params:{comparison: "<=", limit: 1440},message:"must be <= 1440"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
if(data0 <= 0 || isNaN(data0)){
const err6 = {instancePath:instancePath+"/minutes",schemaPath:"#/properties/minutes/exclusiveMinimum",keyword:"exclusiveMinimum",params:{comparison: ">", limit: 0},message:"must be > 0"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
}
else {
const err7 = {instancePath:instancePath+"/minutes",schemaPath:"#/properties/minutes/type",keyword:"type",params:{type: "number"},message:"must be number"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
}
if(data.until !== undefined){
let data1 = data.until;
if(Array.isArray(data1)){
if(data1.length > 30){
const err8 = {instancePath:instancePath+"/until",schemaPath:"#/properties/until/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
if(data1.length < 1){
const err9 = {instancePath:instancePath+"/until",schemaPath:"#/properties/until/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
const len0 = data1.length;
for(let i0=0; i0<len0; i0++){
if(!(validate84(data1[i0], {instancePath:instancePath+"/until/" + i0,parentData:data1,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
}
else {
const err10 = {instancePath:instancePath+"/until",schemaPath:"#/properties/until/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
if(data.because !== undefined){
if(!(validate61(data.because, {instancePath:instancePath+"/because",parentData:data,parentDataProperty:"because",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
}
else {
const err11 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
validate208.errors = vErrors;
return errors === 0;
}
validate208.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};


function validate184(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate184.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.name === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.label === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "label"},message:"must have required property '"+"label"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.unit === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "unit"},message:"must have required property '"+"unit"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.plausible === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "plausible"},message:"must have required property '"+"plausible"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
for(const key0 in data){
if(!(func1.call(schema50.properties, key0))){
const err4 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
if(data.name !== undefined){
if(!(validate66(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.label !== undefined){
if(!(validate55(data.label, {instancePath:instancePath+"/label",parentData:data,parentDataProperty:"label",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.unit !== undefined){
if(!(validate71(data.unit, {instancePath:instancePath+"/unit",parentData:data,parentDataProperty:"unit",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate71.errors : vErrors.concat(validate71.errors);
errors = vErrors.length;
}
}
if(data.sense !== undefined){
if(!(validate78(data.sense, {instancePath:instancePath+"/sense",parentData:data,parentDataProperty:"sense",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate78.errors : vErrors.concat(validate78.errors);
errors = vErrors.length;
}
}
if(data.band !== undefined){
if(!(validate148(data.band, {instancePath:instancePath+"/band",parentData:data,parentDataProperty:"band",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate148.errors : vErrors.concat(validate148.errors);
errors = vErrors.length;
}
}
if(data.gear !== undefined){
if(!(validate66(data.gear, {instancePath:instancePath+"/gear",parentData:data,parentDataProperty:"gear",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.plausible !== undefined){
if(!(validate191(data.plausible, {instancePath:instancePath+"/plausible",parentData:data,parentDataProperty:"plausible",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate191.errors : vErrors.concat(validate191.errors);
errors = vErrors.length;
}
}
if(data.takes !== undefined){
let data7 = data.takes;
if(!(((typeof data7 == "number") && (!(data7 % 1) && !isNaN(data7))) && (isFinite(data7)))){
const err5 = {instancePath:instancePath+"/takes",schemaPath:"#/properties/takes/type",keyword:"type",params:{type: "integer"},message:"must be integer"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
if((typeof data7 == "number") && (isFinite(data7))){
if(data7 > 5 || isNaN(data7)){
const err6 = {instancePath:instancePath+"/takes",schemaPath:"#/properties/takes/maximum",keyword:"maximum",params:{comparison: "<=", limit: 5},message:"must be <= 5"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(data7 < 1 || isNaN(data7)){
const err7 = {instancePath:instancePath+"/takes",schemaPath:"#/properties/takes/minimum",keyword:"minimum",params:{comparison: ">=", limit: 1},message:"must be >= 1"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
}
}
if(data.ways !== undefined){
let data8 = data.ways;
if(Array.isArray(data8)){
if(data8.length > 10){
const err8 = {instancePath:instancePath+"/ways",schemaPath:"#/properties/ways/maxItems",keyword:"maxItems",params:{limit: 10},message:"must NOT have more than 10 items"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
if(data8.length < 1){
const err9 = {instancePath:instancePath+"/ways",schemaPath:"#/properties/ways/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
const len0 = data8.length;
for(let i0=0; i0<len0; i0++){
if(!(validate193(data8[i0], {instancePath:instancePath+"/ways/" + i0,parentData:data8,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate193.errors : vErrors.concat(validate193.errors);
errors = vErrors.length;
}
}
}
else {
const err10 = {instancePath:instancePath+"/ways",schemaPath:"#/properties/ways/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
if(data.validity !== undefined){
if(!(validate208(data.validity, {instancePath:instancePath+"/validity",parentData:data,parentDataProperty:"validity",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate208.errors : vErrors.concat(validate208.errors);
errors = vErrors.length;
}
}
}
else {
const err11 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
validate184.errors = vErrors;
return errors === 0;
}
validate184.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};


function validate172(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate172.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.id === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.number === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "number"},message:"must have required property '"+"number"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.title === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "title"},message:"must have required property '"+"title"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.action === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "action"},message:"must have required property '"+"action"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.kind === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "kind"},message:"must have required property '"+"kind"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(data.otherwise === undefined){
const err5 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "otherwise"},message:"must have required property '"+"otherwise"+"'"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
if(data.cannotMeasure === undefined){
const err6 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "cannotMeasure"},message:"must have required property '"+"cannotMeasure"+"'"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(data.reads === undefined){
const err7 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "reads"},message:"must have required property '"+"reads"+"'"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
for(const key0 in data){
if(!(func1.call(schema49.properties, key0))){
const err8 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
}
if(data.kind !== undefined){
if("reading" !== data.kind){
const err9 = {instancePath:instancePath+"/kind",schemaPath:"#/properties/kind/const",keyword:"const",params:{allowedValue: "reading"},message:"must be equal to constant"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
if(data.id !== undefined){
if(!(validate84(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.number !== undefined){
let data2 = data.number;
if(typeof data2 === "string"){
if(func2(data2) > 8){
const err10 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/maxLength",keyword:"maxLength",params:{limit: 8},message:"must NOT have more than 8 characters"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
if(!pattern9.test(data2)){
const err11 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z0-9]+$"},message:"must match pattern \""+"^[A-Za-z0-9]+$"+"\""};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
}
else {
const err12 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
}
if(data.title !== undefined){
if(!(validate55(data.title, {instancePath:instancePath+"/title",parentData:data,parentDataProperty:"title",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.action !== undefined){
if(!(validate61(data.action, {instancePath:instancePath+"/action",parentData:data,parentDataProperty:"action",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.short !== undefined){
if(!(validate55(data.short, {instancePath:instancePath+"/short",parentData:data,parentDataProperty:"short",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.notes !== undefined){
let data6 = data.notes;
if(Array.isArray(data6)){
if(data6.length > 10){
const err13 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/maxItems",keyword:"maxItems",params:{limit: 10},message:"must NOT have more than 10 items"};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
if(data6.length < 1){
const err14 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err14];
}
else {
vErrors.push(err14);
}
errors++;
}
const len0 = data6.length;
for(let i0=0; i0<len0; i0++){
if(!(validate57(data6[i0], {instancePath:instancePath+"/notes/" + i0,parentData:data6,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
}
else {
const err15 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err15];
}
else {
vErrors.push(err15);
}
errors++;
}
}
if(data.why !== undefined){
if(!(validate57(data.why, {instancePath:instancePath+"/why",parentData:data,parentDataProperty:"why",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.cautions !== undefined){
let data9 = data.cautions;
if(Array.isArray(data9)){
if(data9.length > 12){
const err16 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err16];
}
else {
vErrors.push(err16);
}
errors++;
}
const len1 = data9.length;
for(let i1=0; i1<len1; i1++){
if(!(validate92(data9[i1], {instancePath:instancePath+"/cautions/" + i1,parentData:data9,parentDataProperty:i1,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate92.errors : vErrors.concat(validate92.errors);
errors = vErrors.length;
}
}
}
else {
const err17 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err17];
}
else {
vErrors.push(err17);
}
errors++;
}
}
if(data.picture !== undefined){
if(!(validate120(data.picture, {instancePath:instancePath+"/picture",parentData:data,parentDataProperty:"picture",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate120.errors : vErrors.concat(validate120.errors);
errors = vErrors.length;
}
}
if(data.disturbs !== undefined){
let data12 = data.disturbs;
if(Array.isArray(data12)){
if(data12.length > 12){
const err18 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err18];
}
else {
vErrors.push(err18);
}
errors++;
}
if(data12.length < 1){
const err19 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err19];
}
else {
vErrors.push(err19);
}
errors++;
}
const len2 = data12.length;
for(let i2=0; i2<len2; i2++){
if(!(validate125(data12[i2], {instancePath:instancePath+"/disturbs/" + i2,parentData:data12,parentDataProperty:i2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate125.errors : vErrors.concat(validate125.errors);
errors = vErrors.length;
}
}
}
else {
const err20 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err20];
}
else {
vErrors.push(err20);
}
errors++;
}
}
if(data.stay !== undefined){
if(typeof data.stay !== "boolean"){
const err21 = {instancePath:instancePath+"/stay",schemaPath:"#/properties/stay/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err21];
}
else {
vErrors.push(err21);
}
errors++;
}
}
if(data.release !== undefined){
if(!(validate130(data.release, {instancePath:instancePath+"/release",parentData:data,parentDataProperty:"release",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate130.errors : vErrors.concat(validate130.errors);
errors = vErrors.length;
}
}
if(data.verify !== undefined){
if(!(validate133(data.verify, {instancePath:instancePath+"/verify",parentData:data,parentDataProperty:"verify",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate133.errors : vErrors.concat(validate133.errors);
errors = vErrors.length;
}
}
if(data.reads !== undefined){
let data17 = data.reads;
if(Array.isArray(data17)){
if(data17.length > 20){
const err22 = {instancePath:instancePath+"/reads",schemaPath:"#/properties/reads/maxItems",keyword:"maxItems",params:{limit: 20},message:"must NOT have more than 20 items"};
if(vErrors === null){
vErrors = [err22];
}
else {
vErrors.push(err22);
}
errors++;
}
if(data17.length < 1){
const err23 = {instancePath:instancePath+"/reads",schemaPath:"#/properties/reads/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err23];
}
else {
vErrors.push(err23);
}
errors++;
}
const len3 = data17.length;
for(let i3=0; i3<len3; i3++){
if(!(validate184(data17[i3], {instancePath:instancePath+"/reads/" + i3,parentData:data17,parentDataProperty:i3,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate184.errors : vErrors.concat(validate184.errors);
errors = vErrors.length;
}
}
}
else {
const err24 = {instancePath:instancePath+"/reads",schemaPath:"#/properties/reads/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err24];
}
else {
vErrors.push(err24);
}
errors++;
}
}
if(data.next !== undefined){
let data19 = data.next;
if(Array.isArray(data19)){
if(data19.length > 30){
const err25 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err25];
}
else {
vErrors.push(err25);
}
errors++;
}
const len4 = data19.length;
for(let i4=0; i4<len4; i4++){
if(!(validate136(data19[i4], {instancePath:instancePath+"/next/" + i4,parentData:data19,parentDataProperty:i4,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate136.errors : vErrors.concat(validate136.errors);
errors = vErrors.length;
}
}
}
else {
const err26 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err26];
}
else {
vErrors.push(err26);
}
errors++;
}
}
if(data.otherwise !== undefined){
if(!(validate106(data.otherwise, {instancePath:instancePath+"/otherwise",parentData:data,parentDataProperty:"otherwise",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
if(data.results !== undefined){
let data22 = data.results;
if(Array.isArray(data22)){
if(data22.length > 30){
const err27 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err27];
}
else {
vErrors.push(err27);
}
errors++;
}
const len5 = data22.length;
for(let i5=0; i5<len5; i5++){
if(!(validate143(data22[i5], {instancePath:instancePath+"/results/" + i5,parentData:data22,parentDataProperty:i5,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate143.errors : vErrors.concat(validate143.errors);
errors = vErrors.length;
}
}
}
else {
const err28 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err28];
}
else {
vErrors.push(err28);
}
errors++;
}
}
if(data.cannotMeasure !== undefined){
if(!(validate106(data.cannotMeasure, {instancePath:instancePath+"/cannotMeasure",parentData:data,parentDataProperty:"cannotMeasure",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
}
else {
const err29 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err29];
}
else {
vErrors.push(err29);
}
errors++;
}
validate172.errors = vErrors;
return errors === 0;
}
validate172.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema55 = {"type":"object","properties":{"kind":{"const":"choice"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"name":{"$ref":"#/$defs/name"},"several":{"type":"boolean"},"options":{"type":"array","items":{"$ref":"#/$defs/option"},"minItems":1,"maxItems":30},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"cannotMeasure":{"$ref":"#/$defs/exit"}},"required":["id","number","title","action","kind","otherwise","cannotMeasure","name","options"],"additionalProperties":false};
const schema56 = {"type":"object","properties":{"name":{"$ref":"#/$defs/name"},"label":{"$ref":"#/$defs/label"},"ask":{"$ref":"#/$defs/line"},"alone":{"type":"boolean"},"picture":{"$ref":"#/$defs/picture"}},"required":["name","label"],"additionalProperties":false};

function validate230(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate230.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.name === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.label === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "label"},message:"must have required property '"+"label"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!(((((key0 === "name") || (key0 === "label")) || (key0 === "ask")) || (key0 === "alone")) || (key0 === "picture"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.name !== undefined){
if(!(validate66(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.label !== undefined){
if(!(validate55(data.label, {instancePath:instancePath+"/label",parentData:data,parentDataProperty:"label",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.ask !== undefined){
if(!(validate61(data.ask, {instancePath:instancePath+"/ask",parentData:data,parentDataProperty:"ask",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.alone !== undefined){
if(typeof data.alone !== "boolean"){
const err3 = {instancePath:instancePath+"/alone",schemaPath:"#/properties/alone/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
if(data.picture !== undefined){
if(!(validate120(data.picture, {instancePath:instancePath+"/picture",parentData:data,parentDataProperty:"picture",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate120.errors : vErrors.concat(validate120.errors);
errors = vErrors.length;
}
}
}
else {
const err4 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
validate230.errors = vErrors;
return errors === 0;
}
validate230.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};


function validate217(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate217.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.id === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.number === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "number"},message:"must have required property '"+"number"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.title === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "title"},message:"must have required property '"+"title"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.action === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "action"},message:"must have required property '"+"action"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.kind === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "kind"},message:"must have required property '"+"kind"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(data.otherwise === undefined){
const err5 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "otherwise"},message:"must have required property '"+"otherwise"+"'"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
if(data.cannotMeasure === undefined){
const err6 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "cannotMeasure"},message:"must have required property '"+"cannotMeasure"+"'"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(data.name === undefined){
const err7 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
if(data.options === undefined){
const err8 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "options"},message:"must have required property '"+"options"+"'"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
for(const key0 in data){
if(!(func1.call(schema55.properties, key0))){
const err9 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
if(data.kind !== undefined){
if("choice" !== data.kind){
const err10 = {instancePath:instancePath+"/kind",schemaPath:"#/properties/kind/const",keyword:"const",params:{allowedValue: "choice"},message:"must be equal to constant"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
if(data.id !== undefined){
if(!(validate84(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.number !== undefined){
let data2 = data.number;
if(typeof data2 === "string"){
if(func2(data2) > 8){
const err11 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/maxLength",keyword:"maxLength",params:{limit: 8},message:"must NOT have more than 8 characters"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
if(!pattern9.test(data2)){
const err12 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z0-9]+$"},message:"must match pattern \""+"^[A-Za-z0-9]+$"+"\""};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
}
else {
const err13 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
}
if(data.title !== undefined){
if(!(validate55(data.title, {instancePath:instancePath+"/title",parentData:data,parentDataProperty:"title",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.action !== undefined){
if(!(validate61(data.action, {instancePath:instancePath+"/action",parentData:data,parentDataProperty:"action",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.short !== undefined){
if(!(validate55(data.short, {instancePath:instancePath+"/short",parentData:data,parentDataProperty:"short",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.notes !== undefined){
let data6 = data.notes;
if(Array.isArray(data6)){
if(data6.length > 10){
const err14 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/maxItems",keyword:"maxItems",params:{limit: 10},message:"must NOT have more than 10 items"};
if(vErrors === null){
vErrors = [err14];
}
else {
vErrors.push(err14);
}
errors++;
}
if(data6.length < 1){
const err15 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err15];
}
else {
vErrors.push(err15);
}
errors++;
}
const len0 = data6.length;
for(let i0=0; i0<len0; i0++){
if(!(validate57(data6[i0], {instancePath:instancePath+"/notes/" + i0,parentData:data6,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
}
else {
const err16 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err16];
}
else {
vErrors.push(err16);
}
errors++;
}
}
if(data.why !== undefined){
if(!(validate57(data.why, {instancePath:instancePath+"/why",parentData:data,parentDataProperty:"why",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.cautions !== undefined){
let data9 = data.cautions;
if(Array.isArray(data9)){
if(data9.length > 12){
const err17 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err17];
}
else {
vErrors.push(err17);
}
errors++;
}
const len1 = data9.length;
for(let i1=0; i1<len1; i1++){
if(!(validate92(data9[i1], {instancePath:instancePath+"/cautions/" + i1,parentData:data9,parentDataProperty:i1,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate92.errors : vErrors.concat(validate92.errors);
errors = vErrors.length;
}
}
}
else {
const err18 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err18];
}
else {
vErrors.push(err18);
}
errors++;
}
}
if(data.picture !== undefined){
if(!(validate120(data.picture, {instancePath:instancePath+"/picture",parentData:data,parentDataProperty:"picture",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate120.errors : vErrors.concat(validate120.errors);
errors = vErrors.length;
}
}
if(data.disturbs !== undefined){
let data12 = data.disturbs;
if(Array.isArray(data12)){
if(data12.length > 12){
const err19 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err19];
}
else {
vErrors.push(err19);
}
errors++;
}
if(data12.length < 1){
const err20 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err20];
}
else {
vErrors.push(err20);
}
errors++;
}
const len2 = data12.length;
for(let i2=0; i2<len2; i2++){
if(!(validate125(data12[i2], {instancePath:instancePath+"/disturbs/" + i2,parentData:data12,parentDataProperty:i2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate125.errors : vErrors.concat(validate125.errors);
errors = vErrors.length;
}
}
}
else {
const err21 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err21];
}
else {
vErrors.push(err21);
}
errors++;
}
}
if(data.stay !== undefined){
if(typeof data.stay !== "boolean"){
const err22 = {instancePath:instancePath+"/stay",schemaPath:"#/properties/stay/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err22];
}
else {
vErrors.push(err22);
}
errors++;
}
}
if(data.release !== undefined){
if(!(validate130(data.release, {instancePath:instancePath+"/release",parentData:data,parentDataProperty:"release",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate130.errors : vErrors.concat(validate130.errors);
errors = vErrors.length;
}
}
if(data.verify !== undefined){
if(!(validate133(data.verify, {instancePath:instancePath+"/verify",parentData:data,parentDataProperty:"verify",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate133.errors : vErrors.concat(validate133.errors);
errors = vErrors.length;
}
}
if(data.name !== undefined){
if(!(validate66(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.several !== undefined){
if(typeof data.several !== "boolean"){
const err23 = {instancePath:instancePath+"/several",schemaPath:"#/properties/several/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err23];
}
else {
vErrors.push(err23);
}
errors++;
}
}
if(data.options !== undefined){
let data19 = data.options;
if(Array.isArray(data19)){
if(data19.length > 30){
const err24 = {instancePath:instancePath+"/options",schemaPath:"#/properties/options/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err24];
}
else {
vErrors.push(err24);
}
errors++;
}
if(data19.length < 1){
const err25 = {instancePath:instancePath+"/options",schemaPath:"#/properties/options/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err25];
}
else {
vErrors.push(err25);
}
errors++;
}
const len3 = data19.length;
for(let i3=0; i3<len3; i3++){
if(!(validate230(data19[i3], {instancePath:instancePath+"/options/" + i3,parentData:data19,parentDataProperty:i3,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate230.errors : vErrors.concat(validate230.errors);
errors = vErrors.length;
}
}
}
else {
const err26 = {instancePath:instancePath+"/options",schemaPath:"#/properties/options/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err26];
}
else {
vErrors.push(err26);
}
errors++;
}
}
if(data.next !== undefined){
let data21 = data.next;
if(Array.isArray(data21)){
if(data21.length > 30){
const err27 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err27];
}
else {
vErrors.push(err27);
}
errors++;
}
const len4 = data21.length;
for(let i4=0; i4<len4; i4++){
if(!(validate136(data21[i4], {instancePath:instancePath+"/next/" + i4,parentData:data21,parentDataProperty:i4,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate136.errors : vErrors.concat(validate136.errors);
errors = vErrors.length;
}
}
}
else {
const err28 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err28];
}
else {
vErrors.push(err28);
}
errors++;
}
}
if(data.otherwise !== undefined){
if(!(validate106(data.otherwise, {instancePath:instancePath+"/otherwise",parentData:data,parentDataProperty:"otherwise",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
if(data.results !== undefined){
let data24 = data.results;
if(Array.isArray(data24)){
if(data24.length > 30){
const err29 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err29];
}
else {
vErrors.push(err29);
}
errors++;
}
const len5 = data24.length;
for(let i5=0; i5<len5; i5++){
if(!(validate143(data24[i5], {instancePath:instancePath+"/results/" + i5,parentData:data24,parentDataProperty:i5,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate143.errors : vErrors.concat(validate143.errors);
errors = vErrors.length;
}
}
}
else {
const err30 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err30];
}
else {
vErrors.push(err30);
}
errors++;
}
}
if(data.cannotMeasure !== undefined){
if(!(validate106(data.cannotMeasure, {instancePath:instancePath+"/cannotMeasure",parentData:data,parentDataProperty:"cannotMeasure",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
}
else {
const err31 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err31];
}
else {
vErrors.push(err31);
}
errors++;
}
validate217.errors = vErrors;
return errors === 0;
}
validate217.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema57 = {"type":"object","properties":{"kind":{"const":"listen"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"name":{"$ref":"#/$defs/name"},"channels":{"type":"array","items":{"$ref":"#/$defs/channel"},"minItems":1,"maxItems":4},"target":{"type":"number"},"finds":{"type":"array","items":{"$ref":"#/$defs/found"},"minItems":1,"maxItems":20},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"cannotMeasure":{"$ref":"#/$defs/exit"}},"required":["id","number","title","action","kind","otherwise","cannotMeasure","name","channels","target","finds"],"additionalProperties":false};
const schema58 = {"type":"object","properties":{"name":{"enum":["gauge","manifold","boost","sound"]},"label":{"$ref":"#/$defs/label"},"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"},"gear":{"$ref":"#/$defs/name"},"needed":{"type":"boolean"}},"required":["name","label","unit","needed"],"additionalProperties":false};

function validate253(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate253.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.name === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.label === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "label"},message:"must have required property '"+"label"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.unit === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "unit"},message:"must have required property '"+"unit"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.needed === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "needed"},message:"must have required property '"+"needed"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
for(const key0 in data){
if(!((((((key0 === "name") || (key0 === "label")) || (key0 === "unit")) || (key0 === "sense")) || (key0 === "gear")) || (key0 === "needed"))){
const err4 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
if(data.name !== undefined){
let data0 = data.name;
if(!((((data0 === "gauge") || (data0 === "manifold")) || (data0 === "boost")) || (data0 === "sound"))){
const err5 = {instancePath:instancePath+"/name",schemaPath:"#/properties/name/enum",keyword:"enum",params:{allowedValues: schema58.properties.name.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
if(data.label !== undefined){
if(!(validate55(data.label, {instancePath:instancePath+"/label",parentData:data,parentDataProperty:"label",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.unit !== undefined){
if(!(validate71(data.unit, {instancePath:instancePath+"/unit",parentData:data,parentDataProperty:"unit",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate71.errors : vErrors.concat(validate71.errors);
errors = vErrors.length;
}
}
if(data.sense !== undefined){
if(!(validate78(data.sense, {instancePath:instancePath+"/sense",parentData:data,parentDataProperty:"sense",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate78.errors : vErrors.concat(validate78.errors);
errors = vErrors.length;
}
}
if(data.gear !== undefined){
if(!(validate66(data.gear, {instancePath:instancePath+"/gear",parentData:data,parentDataProperty:"gear",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.needed !== undefined){
if(typeof data.needed !== "boolean"){
const err6 = {instancePath:instancePath+"/needed",schemaPath:"#/properties/needed/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
}
}
else {
const err7 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
validate253.errors = vErrors;
return errors === 0;
}
validate253.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema59 = {"type":"object","discriminator":{"propertyName":"what"},"required":["what"],"oneOf":[{"$ref":"#/$defs/foundTruth"},{"$ref":"#/$defs/foundQuantity"}]};
const schema60 = {"type":"object","properties":{"what":{"enum":["noise-heard","noise-stopped"]},"name":{"$ref":"#/$defs/name"}},"required":["what","name"],"additionalProperties":false};

function validate260(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate260.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.what === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "what"},message:"must have required property '"+"what"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.name === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "what") || (key0 === "name"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.what !== undefined){
let data0 = data.what;
if(!((data0 === "noise-heard") || (data0 === "noise-stopped"))){
const err3 = {instancePath:instancePath+"/what",schemaPath:"#/properties/what/enum",keyword:"enum",params:{allowedValues: schema60.properties.what.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
if(data.name !== undefined){
if(!(validate66(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err4 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
validate260.errors = vErrors;
return errors === 0;
}
validate260.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema61 = {"type":"object","properties":{"what":{"enum":["seal-point","highest-gauge","rise-rate","manifold-gain","boost-gain","worst-gap"]},"name":{"$ref":"#/$defs/name"},"label":{"$ref":"#/$defs/label"},"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"},"band":{"$ref":"#/$defs/band"}},"required":["what","name","label","unit"],"additionalProperties":false};

function validate262(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate262.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.what === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "what"},message:"must have required property '"+"what"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.name === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.label === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "label"},message:"must have required property '"+"label"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.unit === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "unit"},message:"must have required property '"+"unit"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
for(const key0 in data){
if(!((((((key0 === "what") || (key0 === "name")) || (key0 === "label")) || (key0 === "unit")) || (key0 === "sense")) || (key0 === "band"))){
const err4 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
if(data.what !== undefined){
let data0 = data.what;
if(!((((((data0 === "seal-point") || (data0 === "highest-gauge")) || (data0 === "rise-rate")) || (data0 === "manifold-gain")) || (data0 === "boost-gain")) || (data0 === "worst-gap"))){
const err5 = {instancePath:instancePath+"/what",schemaPath:"#/properties/what/enum",keyword:"enum",params:{allowedValues: schema61.properties.what.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
}
if(data.name !== undefined){
if(!(validate66(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.label !== undefined){
if(!(validate55(data.label, {instancePath:instancePath+"/label",parentData:data,parentDataProperty:"label",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.unit !== undefined){
if(!(validate71(data.unit, {instancePath:instancePath+"/unit",parentData:data,parentDataProperty:"unit",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate71.errors : vErrors.concat(validate71.errors);
errors = vErrors.length;
}
}
if(data.sense !== undefined){
if(!(validate78(data.sense, {instancePath:instancePath+"/sense",parentData:data,parentDataProperty:"sense",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate78.errors : vErrors.concat(validate78.errors);
errors = vErrors.length;
}
}
if(data.band !== undefined){
if(!(validate148(data.band, {instancePath:instancePath+"/band",parentData:data,parentDataProperty:"band",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate148.errors : vErrors.concat(validate148.errors);
errors = vErrors.length;
}
}
}
else {
const err6 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
validate262.errors = vErrors;
return errors === 0;
}
validate262.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};


function validate259(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate259.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.what === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "what"},message:"must have required property '"+"what"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
const tag0 = data.what;
if(typeof tag0 == "string"){
if(tag0 === "noise-heard"){
if(!(validate260(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate260.errors : vErrors.concat(validate260.errors);
errors = vErrors.length;
}
var props0 = true;
}
else if(tag0 === "noise-stopped"){
if(!(validate260(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate260.errors : vErrors.concat(validate260.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else if(tag0 === "seal-point"){
if(!(validate262(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate262.errors : vErrors.concat(validate262.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else if(tag0 === "highest-gauge"){
if(!(validate262(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate262.errors : vErrors.concat(validate262.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else if(tag0 === "rise-rate"){
if(!(validate262(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate262.errors : vErrors.concat(validate262.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else if(tag0 === "manifold-gain"){
if(!(validate262(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate262.errors : vErrors.concat(validate262.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else if(tag0 === "boost-gain"){
if(!(validate262(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate262.errors : vErrors.concat(validate262.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else if(tag0 === "worst-gap"){
if(!(validate262(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate262.errors : vErrors.concat(validate262.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else {
const err1 = {instancePath,schemaPath:"#/discriminator",keyword:"discriminator",params:{error: "mapping", tag: "what", tagValue: tag0},message:"value of tag \"what\" must be in oneOf"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
else {
const err2 = {instancePath,schemaPath:"#/discriminator",keyword:"discriminator",params:{error: "tag", tag: "what", tagValue: tag0},message:"tag \"what\" must be string"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate259.errors = vErrors;
evaluated0.props = props0;
return errors === 0;
}
validate259.evaluated = {"dynamicProps":true,"dynamicItems":false};


function validate240(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate240.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.id === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.number === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "number"},message:"must have required property '"+"number"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.title === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "title"},message:"must have required property '"+"title"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.action === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "action"},message:"must have required property '"+"action"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.kind === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "kind"},message:"must have required property '"+"kind"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(data.otherwise === undefined){
const err5 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "otherwise"},message:"must have required property '"+"otherwise"+"'"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
if(data.cannotMeasure === undefined){
const err6 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "cannotMeasure"},message:"must have required property '"+"cannotMeasure"+"'"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(data.name === undefined){
const err7 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
if(data.channels === undefined){
const err8 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "channels"},message:"must have required property '"+"channels"+"'"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
if(data.target === undefined){
const err9 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "target"},message:"must have required property '"+"target"+"'"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
if(data.finds === undefined){
const err10 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "finds"},message:"must have required property '"+"finds"+"'"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
for(const key0 in data){
if(!(func1.call(schema57.properties, key0))){
const err11 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
}
if(data.kind !== undefined){
if("listen" !== data.kind){
const err12 = {instancePath:instancePath+"/kind",schemaPath:"#/properties/kind/const",keyword:"const",params:{allowedValue: "listen"},message:"must be equal to constant"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
}
if(data.id !== undefined){
if(!(validate84(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.number !== undefined){
let data2 = data.number;
if(typeof data2 === "string"){
if(func2(data2) > 8){
const err13 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/maxLength",keyword:"maxLength",params:{limit: 8},message:"must NOT have more than 8 characters"};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
if(!pattern9.test(data2)){
const err14 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z0-9]+$"},message:"must match pattern \""+"^[A-Za-z0-9]+$"+"\""};
if(vErrors === null){
vErrors = [err14];
}
else {
vErrors.push(err14);
}
errors++;
}
}
else {
const err15 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err15];
}
else {
vErrors.push(err15);
}
errors++;
}
}
if(data.title !== undefined){
if(!(validate55(data.title, {instancePath:instancePath+"/title",parentData:data,parentDataProperty:"title",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.action !== undefined){
if(!(validate61(data.action, {instancePath:instancePath+"/action",parentData:data,parentDataProperty:"action",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.short !== undefined){
if(!(validate55(data.short, {instancePath:instancePath+"/short",parentData:data,parentDataProperty:"short",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.notes !== undefined){
let data6 = data.notes;
if(Array.isArray(data6)){
if(data6.length > 10){
const err16 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/maxItems",keyword:"maxItems",params:{limit: 10},message:"must NOT have more than 10 items"};
if(vErrors === null){
vErrors = [err16];
}
else {
vErrors.push(err16);
}
errors++;
}
if(data6.length < 1){
const err17 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err17];
}
else {
vErrors.push(err17);
}
errors++;
}
const len0 = data6.length;
for(let i0=0; i0<len0; i0++){
if(!(validate57(data6[i0], {instancePath:instancePath+"/notes/" + i0,parentData:data6,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
}
else {
const err18 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err18];
}
else {
vErrors.push(err18);
}
errors++;
}
}
if(data.why !== undefined){
if(!(validate57(data.why, {instancePath:instancePath+"/why",parentData:data,parentDataProperty:"why",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.cautions !== undefined){
let data9 = data.cautions;
if(Array.isArray(data9)){
if(data9.length > 12){
const err19 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err19];
}
else {
vErrors.push(err19);
}
errors++;
}
const len1 = data9.length;
for(let i1=0; i1<len1; i1++){
if(!(validate92(data9[i1], {instancePath:instancePath+"/cautions/" + i1,parentData:data9,parentDataProperty:i1,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate92.errors : vErrors.concat(validate92.errors);
errors = vErrors.length;
}
}
}
else {
const err20 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err20];
}
else {
vErrors.push(err20);
}
errors++;
}
}
if(data.picture !== undefined){
if(!(validate120(data.picture, {instancePath:instancePath+"/picture",parentData:data,parentDataProperty:"picture",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate120.errors : vErrors.concat(validate120.errors);
errors = vErrors.length;
}
}
if(data.disturbs !== undefined){
let data12 = data.disturbs;
if(Array.isArray(data12)){
if(data12.length > 12){
const err21 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err21];
}
else {
vErrors.push(err21);
}
errors++;
}
if(data12.length < 1){
const err22 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err22];
}
else {
vErrors.push(err22);
}
errors++;
}
const len2 = data12.length;
for(let i2=0; i2<len2; i2++){
if(!(validate125(data12[i2], {instancePath:instancePath+"/disturbs/" + i2,parentData:data12,parentDataProperty:i2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate125.errors : vErrors.concat(validate125.errors);
errors = vErrors.length;
}
}
}
else {
const err23 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err23];
}
else {
vErrors.push(err23);
}
errors++;
}
}
if(data.stay !== undefined){
if(typeof data.stay !== "boolean"){
const err24 = {instancePath:instancePath+"/stay",schemaPath:"#/properties/stay/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err24];
}
else {
vErrors.push(err24);
}
errors++;
}
}
if(data.release !== undefined){
if(!(validate130(data.release, {instancePath:instancePath+"/release",parentData:data,parentDataProperty:"release",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate130.errors : vErrors.concat(validate130.errors);
errors = vErrors.length;
}
}
if(data.verify !== undefined){
if(!(validate133(data.verify, {instancePath:instancePath+"/verify",parentData:data,parentDataProperty:"verify",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate133.errors : vErrors.concat(validate133.errors);
errors = vErrors.length;
}
}
if(data.name !== undefined){
if(!(validate66(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.channels !== undefined){
let data18 = data.channels;
if(Array.isArray(data18)){
if(data18.length > 4){
const err25 = {instancePath:instancePath+"/channels",schemaPath:"#/properties/channels/maxItems",keyword:"maxItems",params:{limit: 4},message:"must NOT have more than 4 items"};
if(vErrors === null){
vErrors = [err25];
}
else {
vErrors.push(err25);
}
errors++;
}
if(data18.length < 1){
const err26 = {instancePath:instancePath+"/channels",schemaPath:"#/properties/channels/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err26];
}
else {
vErrors.push(err26);
}
errors++;
}
const len3 = data18.length;
for(let i3=0; i3<len3; i3++){
if(!(validate253(data18[i3], {instancePath:instancePath+"/channels/" + i3,parentData:data18,parentDataProperty:i3,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate253.errors : vErrors.concat(validate253.errors);
errors = vErrors.length;
}
}
}
else {
const err27 = {instancePath:instancePath+"/channels",schemaPath:"#/properties/channels/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err27];
}
else {
vErrors.push(err27);
}
errors++;
}
}
if(data.target !== undefined){
let data20 = data.target;
if(!((typeof data20 == "number") && (isFinite(data20)))){
const err28 = {instancePath:instancePath+"/target",schemaPath:"#/properties/target/type",keyword:"type",params:{type: "number"},message:"must be number"};
if(vErrors === null){
vErrors = [err28];
}
else {
vErrors.push(err28);
}
errors++;
}
}
if(data.finds !== undefined){
let data21 = data.finds;
if(Array.isArray(data21)){
if(data21.length > 20){
const err29 = {instancePath:instancePath+"/finds",schemaPath:"#/properties/finds/maxItems",keyword:"maxItems",params:{limit: 20},message:"must NOT have more than 20 items"};
if(vErrors === null){
vErrors = [err29];
}
else {
vErrors.push(err29);
}
errors++;
}
if(data21.length < 1){
const err30 = {instancePath:instancePath+"/finds",schemaPath:"#/properties/finds/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err30];
}
else {
vErrors.push(err30);
}
errors++;
}
const len4 = data21.length;
for(let i4=0; i4<len4; i4++){
if(!(validate259(data21[i4], {instancePath:instancePath+"/finds/" + i4,parentData:data21,parentDataProperty:i4,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate259.errors : vErrors.concat(validate259.errors);
errors = vErrors.length;
}
}
}
else {
const err31 = {instancePath:instancePath+"/finds",schemaPath:"#/properties/finds/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err31];
}
else {
vErrors.push(err31);
}
errors++;
}
}
if(data.next !== undefined){
let data23 = data.next;
if(Array.isArray(data23)){
if(data23.length > 30){
const err32 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err32];
}
else {
vErrors.push(err32);
}
errors++;
}
const len5 = data23.length;
for(let i5=0; i5<len5; i5++){
if(!(validate136(data23[i5], {instancePath:instancePath+"/next/" + i5,parentData:data23,parentDataProperty:i5,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate136.errors : vErrors.concat(validate136.errors);
errors = vErrors.length;
}
}
}
else {
const err33 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err33];
}
else {
vErrors.push(err33);
}
errors++;
}
}
if(data.otherwise !== undefined){
if(!(validate106(data.otherwise, {instancePath:instancePath+"/otherwise",parentData:data,parentDataProperty:"otherwise",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
if(data.results !== undefined){
let data26 = data.results;
if(Array.isArray(data26)){
if(data26.length > 30){
const err34 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err34];
}
else {
vErrors.push(err34);
}
errors++;
}
const len6 = data26.length;
for(let i6=0; i6<len6; i6++){
if(!(validate143(data26[i6], {instancePath:instancePath+"/results/" + i6,parentData:data26,parentDataProperty:i6,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate143.errors : vErrors.concat(validate143.errors);
errors = vErrors.length;
}
}
}
else {
const err35 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err35];
}
else {
vErrors.push(err35);
}
errors++;
}
}
if(data.cannotMeasure !== undefined){
if(!(validate106(data.cannotMeasure, {instancePath:instancePath+"/cannotMeasure",parentData:data,parentDataProperty:"cannotMeasure",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
}
else {
const err36 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err36];
}
else {
vErrors.push(err36);
}
errors++;
}
validate240.errors = vErrors;
return errors === 0;
}
validate240.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema62 = {"type":"object","properties":{"kind":{"const":"hold"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"heldAs":{"$ref":"#/$defs/name"},"seconds":{"type":"integer","minimum":1,"maximum":86400},"begins":{"type":"array","items":{"$ref":"#/$defs/readQuantity"},"minItems":1,"maxItems":20},"ends":{"type":"array","items":{"$ref":"#/$defs/readQuantity"},"minItems":1,"maxItems":20},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"cannotMeasure":{"$ref":"#/$defs/exit"}},"required":["id","number","title","action","kind","otherwise","cannotMeasure","seconds"],"additionalProperties":false};

function validate281(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate281.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.id === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.number === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "number"},message:"must have required property '"+"number"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.title === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "title"},message:"must have required property '"+"title"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.action === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "action"},message:"must have required property '"+"action"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.kind === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "kind"},message:"must have required property '"+"kind"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(data.otherwise === undefined){
const err5 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "otherwise"},message:"must have required property '"+"otherwise"+"'"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
if(data.cannotMeasure === undefined){
const err6 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "cannotMeasure"},message:"must have required property '"+"cannotMeasure"+"'"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(data.seconds === undefined){
const err7 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "seconds"},message:"must have required property '"+"seconds"+"'"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
for(const key0 in data){
if(!(func1.call(schema62.properties, key0))){
const err8 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
}
if(data.kind !== undefined){
if("hold" !== data.kind){
const err9 = {instancePath:instancePath+"/kind",schemaPath:"#/properties/kind/const",keyword:"const",params:{allowedValue: "hold"},message:"must be equal to constant"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
if(data.id !== undefined){
if(!(validate84(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.number !== undefined){
let data2 = data.number;
if(typeof data2 === "string"){
if(func2(data2) > 8){
const err10 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/maxLength",keyword:"maxLength",params:{limit: 8},message:"must NOT have more than 8 characters"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
if(!pattern9.test(data2)){
const err11 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z0-9]+$"},message:"must match pattern \""+"^[A-Za-z0-9]+$"+"\""};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
}
else {
const err12 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
}
if(data.title !== undefined){
if(!(validate55(data.title, {instancePath:instancePath+"/title",parentData:data,parentDataProperty:"title",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.action !== undefined){
if(!(validate61(data.action, {instancePath:instancePath+"/action",parentData:data,parentDataProperty:"action",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.short !== undefined){
if(!(validate55(data.short, {instancePath:instancePath+"/short",parentData:data,parentDataProperty:"short",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.notes !== undefined){
let data6 = data.notes;
if(Array.isArray(data6)){
if(data6.length > 10){
const err13 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/maxItems",keyword:"maxItems",params:{limit: 10},message:"must NOT have more than 10 items"};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
if(data6.length < 1){
const err14 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err14];
}
else {
vErrors.push(err14);
}
errors++;
}
const len0 = data6.length;
for(let i0=0; i0<len0; i0++){
if(!(validate57(data6[i0], {instancePath:instancePath+"/notes/" + i0,parentData:data6,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
}
else {
const err15 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err15];
}
else {
vErrors.push(err15);
}
errors++;
}
}
if(data.why !== undefined){
if(!(validate57(data.why, {instancePath:instancePath+"/why",parentData:data,parentDataProperty:"why",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.cautions !== undefined){
let data9 = data.cautions;
if(Array.isArray(data9)){
if(data9.length > 12){
const err16 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err16];
}
else {
vErrors.push(err16);
}
errors++;
}
const len1 = data9.length;
for(let i1=0; i1<len1; i1++){
if(!(validate92(data9[i1], {instancePath:instancePath+"/cautions/" + i1,parentData:data9,parentDataProperty:i1,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate92.errors : vErrors.concat(validate92.errors);
errors = vErrors.length;
}
}
}
else {
const err17 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err17];
}
else {
vErrors.push(err17);
}
errors++;
}
}
if(data.picture !== undefined){
if(!(validate120(data.picture, {instancePath:instancePath+"/picture",parentData:data,parentDataProperty:"picture",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate120.errors : vErrors.concat(validate120.errors);
errors = vErrors.length;
}
}
if(data.disturbs !== undefined){
let data12 = data.disturbs;
if(Array.isArray(data12)){
if(data12.length > 12){
const err18 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err18];
}
else {
vErrors.push(err18);
}
errors++;
}
if(data12.length < 1){
const err19 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err19];
}
else {
vErrors.push(err19);
}
errors++;
}
const len2 = data12.length;
for(let i2=0; i2<len2; i2++){
if(!(validate125(data12[i2], {instancePath:instancePath+"/disturbs/" + i2,parentData:data12,parentDataProperty:i2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate125.errors : vErrors.concat(validate125.errors);
errors = vErrors.length;
}
}
}
else {
const err20 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err20];
}
else {
vErrors.push(err20);
}
errors++;
}
}
if(data.stay !== undefined){
if(typeof data.stay !== "boolean"){
const err21 = {instancePath:instancePath+"/stay",schemaPath:"#/properties/stay/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err21];
}
else {
vErrors.push(err21);
}
errors++;
}
}
if(data.release !== undefined){
if(!(validate130(data.release, {instancePath:instancePath+"/release",parentData:data,parentDataProperty:"release",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate130.errors : vErrors.concat(validate130.errors);
errors = vErrors.length;
}
}
if(data.verify !== undefined){
if(!(validate133(data.verify, {instancePath:instancePath+"/verify",parentData:data,parentDataProperty:"verify",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate133.errors : vErrors.concat(validate133.errors);
errors = vErrors.length;
}
}
if(data.heldAs !== undefined){
if(!(validate66(data.heldAs, {instancePath:instancePath+"/heldAs",parentData:data,parentDataProperty:"heldAs",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.seconds !== undefined){
let data18 = data.seconds;
if(!(((typeof data18 == "number") && (!(data18 % 1) && !isNaN(data18))) && (isFinite(data18)))){
const err22 = {instancePath:instancePath+"/seconds",schemaPath:"#/properties/seconds/type",keyword:"type",params:{type: "integer"},message:"must be integer"};
if(vErrors === null){
vErrors = [err22];
}
else {
vErrors.push(err22);
}
errors++;
}
if((typeof data18 == "number") && (isFinite(data18))){
if(data18 > 86400 || isNaN(data18)){
const err23 = {instancePath:instancePath+"/seconds",schemaPath:"#/properties/seconds/maximum",keyword:"maximum",params:{comparison: "<=", limit: 86400},message:"must be <= 86400"};
if(vErrors === null){
vErrors = [err23];
}
else {
vErrors.push(err23);
}
errors++;
}
if(data18 < 1 || isNaN(data18)){
const err24 = {instancePath:instancePath+"/seconds",schemaPath:"#/properties/seconds/minimum",keyword:"minimum",params:{comparison: ">=", limit: 1},message:"must be >= 1"};
if(vErrors === null){
vErrors = [err24];
}
else {
vErrors.push(err24);
}
errors++;
}
}
}
if(data.begins !== undefined){
let data19 = data.begins;
if(Array.isArray(data19)){
if(data19.length > 20){
const err25 = {instancePath:instancePath+"/begins",schemaPath:"#/properties/begins/maxItems",keyword:"maxItems",params:{limit: 20},message:"must NOT have more than 20 items"};
if(vErrors === null){
vErrors = [err25];
}
else {
vErrors.push(err25);
}
errors++;
}
if(data19.length < 1){
const err26 = {instancePath:instancePath+"/begins",schemaPath:"#/properties/begins/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err26];
}
else {
vErrors.push(err26);
}
errors++;
}
const len3 = data19.length;
for(let i3=0; i3<len3; i3++){
if(!(validate184(data19[i3], {instancePath:instancePath+"/begins/" + i3,parentData:data19,parentDataProperty:i3,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate184.errors : vErrors.concat(validate184.errors);
errors = vErrors.length;
}
}
}
else {
const err27 = {instancePath:instancePath+"/begins",schemaPath:"#/properties/begins/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err27];
}
else {
vErrors.push(err27);
}
errors++;
}
}
if(data.ends !== undefined){
let data21 = data.ends;
if(Array.isArray(data21)){
if(data21.length > 20){
const err28 = {instancePath:instancePath+"/ends",schemaPath:"#/properties/ends/maxItems",keyword:"maxItems",params:{limit: 20},message:"must NOT have more than 20 items"};
if(vErrors === null){
vErrors = [err28];
}
else {
vErrors.push(err28);
}
errors++;
}
if(data21.length < 1){
const err29 = {instancePath:instancePath+"/ends",schemaPath:"#/properties/ends/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err29];
}
else {
vErrors.push(err29);
}
errors++;
}
const len4 = data21.length;
for(let i4=0; i4<len4; i4++){
if(!(validate184(data21[i4], {instancePath:instancePath+"/ends/" + i4,parentData:data21,parentDataProperty:i4,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate184.errors : vErrors.concat(validate184.errors);
errors = vErrors.length;
}
}
}
else {
const err30 = {instancePath:instancePath+"/ends",schemaPath:"#/properties/ends/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err30];
}
else {
vErrors.push(err30);
}
errors++;
}
}
if(data.next !== undefined){
let data23 = data.next;
if(Array.isArray(data23)){
if(data23.length > 30){
const err31 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err31];
}
else {
vErrors.push(err31);
}
errors++;
}
const len5 = data23.length;
for(let i5=0; i5<len5; i5++){
if(!(validate136(data23[i5], {instancePath:instancePath+"/next/" + i5,parentData:data23,parentDataProperty:i5,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate136.errors : vErrors.concat(validate136.errors);
errors = vErrors.length;
}
}
}
else {
const err32 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err32];
}
else {
vErrors.push(err32);
}
errors++;
}
}
if(data.otherwise !== undefined){
if(!(validate106(data.otherwise, {instancePath:instancePath+"/otherwise",parentData:data,parentDataProperty:"otherwise",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
if(data.results !== undefined){
let data26 = data.results;
if(Array.isArray(data26)){
if(data26.length > 30){
const err33 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err33];
}
else {
vErrors.push(err33);
}
errors++;
}
const len6 = data26.length;
for(let i6=0; i6<len6; i6++){
if(!(validate143(data26[i6], {instancePath:instancePath+"/results/" + i6,parentData:data26,parentDataProperty:i6,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate143.errors : vErrors.concat(validate143.errors);
errors = vErrors.length;
}
}
}
else {
const err34 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err34];
}
else {
vErrors.push(err34);
}
errors++;
}
}
if(data.cannotMeasure !== undefined){
if(!(validate106(data.cannotMeasure, {instancePath:instancePath+"/cannotMeasure",parentData:data,parentDataProperty:"cannotMeasure",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
}
else {
const err35 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err35];
}
else {
vErrors.push(err35);
}
errors++;
}
validate281.errors = vErrors;
return errors === 0;
}
validate281.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema63 = {"type":"object","properties":{"kind":{"const":"wait"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"reads":{"type":"array","items":{"$ref":"#/$defs/readQuantity"},"minItems":1,"maxItems":20},"until":{"$ref":"#/$defs/expression"},"atLeastSeconds":{"type":"integer","minimum":1,"maximum":86400},"meanwhile":{"$ref":"#/$defs/paragraph"},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"cannotMeasure":{"$ref":"#/$defs/exit"}},"required":["id","number","title","action","kind","otherwise","cannotMeasure","reads","until","meanwhile"],"additionalProperties":false};

function validate300(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate300.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.id === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.number === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "number"},message:"must have required property '"+"number"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.title === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "title"},message:"must have required property '"+"title"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.action === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "action"},message:"must have required property '"+"action"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.kind === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "kind"},message:"must have required property '"+"kind"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(data.otherwise === undefined){
const err5 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "otherwise"},message:"must have required property '"+"otherwise"+"'"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
if(data.cannotMeasure === undefined){
const err6 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "cannotMeasure"},message:"must have required property '"+"cannotMeasure"+"'"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(data.reads === undefined){
const err7 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "reads"},message:"must have required property '"+"reads"+"'"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
if(data.until === undefined){
const err8 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "until"},message:"must have required property '"+"until"+"'"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
if(data.meanwhile === undefined){
const err9 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "meanwhile"},message:"must have required property '"+"meanwhile"+"'"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
for(const key0 in data){
if(!(func1.call(schema63.properties, key0))){
const err10 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
if(data.kind !== undefined){
if("wait" !== data.kind){
const err11 = {instancePath:instancePath+"/kind",schemaPath:"#/properties/kind/const",keyword:"const",params:{allowedValue: "wait"},message:"must be equal to constant"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
}
if(data.id !== undefined){
if(!(validate84(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.number !== undefined){
let data2 = data.number;
if(typeof data2 === "string"){
if(func2(data2) > 8){
const err12 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/maxLength",keyword:"maxLength",params:{limit: 8},message:"must NOT have more than 8 characters"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
if(!pattern9.test(data2)){
const err13 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z0-9]+$"},message:"must match pattern \""+"^[A-Za-z0-9]+$"+"\""};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
}
else {
const err14 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err14];
}
else {
vErrors.push(err14);
}
errors++;
}
}
if(data.title !== undefined){
if(!(validate55(data.title, {instancePath:instancePath+"/title",parentData:data,parentDataProperty:"title",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.action !== undefined){
if(!(validate61(data.action, {instancePath:instancePath+"/action",parentData:data,parentDataProperty:"action",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.short !== undefined){
if(!(validate55(data.short, {instancePath:instancePath+"/short",parentData:data,parentDataProperty:"short",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.notes !== undefined){
let data6 = data.notes;
if(Array.isArray(data6)){
if(data6.length > 10){
const err15 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/maxItems",keyword:"maxItems",params:{limit: 10},message:"must NOT have more than 10 items"};
if(vErrors === null){
vErrors = [err15];
}
else {
vErrors.push(err15);
}
errors++;
}
if(data6.length < 1){
const err16 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err16];
}
else {
vErrors.push(err16);
}
errors++;
}
const len0 = data6.length;
for(let i0=0; i0<len0; i0++){
if(!(validate57(data6[i0], {instancePath:instancePath+"/notes/" + i0,parentData:data6,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
}
else {
const err17 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err17];
}
else {
vErrors.push(err17);
}
errors++;
}
}
if(data.why !== undefined){
if(!(validate57(data.why, {instancePath:instancePath+"/why",parentData:data,parentDataProperty:"why",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.cautions !== undefined){
let data9 = data.cautions;
if(Array.isArray(data9)){
if(data9.length > 12){
const err18 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err18];
}
else {
vErrors.push(err18);
}
errors++;
}
const len1 = data9.length;
for(let i1=0; i1<len1; i1++){
if(!(validate92(data9[i1], {instancePath:instancePath+"/cautions/" + i1,parentData:data9,parentDataProperty:i1,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate92.errors : vErrors.concat(validate92.errors);
errors = vErrors.length;
}
}
}
else {
const err19 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err19];
}
else {
vErrors.push(err19);
}
errors++;
}
}
if(data.picture !== undefined){
if(!(validate120(data.picture, {instancePath:instancePath+"/picture",parentData:data,parentDataProperty:"picture",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate120.errors : vErrors.concat(validate120.errors);
errors = vErrors.length;
}
}
if(data.disturbs !== undefined){
let data12 = data.disturbs;
if(Array.isArray(data12)){
if(data12.length > 12){
const err20 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err20];
}
else {
vErrors.push(err20);
}
errors++;
}
if(data12.length < 1){
const err21 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err21];
}
else {
vErrors.push(err21);
}
errors++;
}
const len2 = data12.length;
for(let i2=0; i2<len2; i2++){
if(!(validate125(data12[i2], {instancePath:instancePath+"/disturbs/" + i2,parentData:data12,parentDataProperty:i2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate125.errors : vErrors.concat(validate125.errors);
errors = vErrors.length;
}
}
}
else {
const err22 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err22];
}
else {
vErrors.push(err22);
}
errors++;
}
}
if(data.stay !== undefined){
if(typeof data.stay !== "boolean"){
const err23 = {instancePath:instancePath+"/stay",schemaPath:"#/properties/stay/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err23];
}
else {
vErrors.push(err23);
}
errors++;
}
}
if(data.release !== undefined){
if(!(validate130(data.release, {instancePath:instancePath+"/release",parentData:data,parentDataProperty:"release",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate130.errors : vErrors.concat(validate130.errors);
errors = vErrors.length;
}
}
if(data.verify !== undefined){
if(!(validate133(data.verify, {instancePath:instancePath+"/verify",parentData:data,parentDataProperty:"verify",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate133.errors : vErrors.concat(validate133.errors);
errors = vErrors.length;
}
}
if(data.reads !== undefined){
let data17 = data.reads;
if(Array.isArray(data17)){
if(data17.length > 20){
const err24 = {instancePath:instancePath+"/reads",schemaPath:"#/properties/reads/maxItems",keyword:"maxItems",params:{limit: 20},message:"must NOT have more than 20 items"};
if(vErrors === null){
vErrors = [err24];
}
else {
vErrors.push(err24);
}
errors++;
}
if(data17.length < 1){
const err25 = {instancePath:instancePath+"/reads",schemaPath:"#/properties/reads/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err25];
}
else {
vErrors.push(err25);
}
errors++;
}
const len3 = data17.length;
for(let i3=0; i3<len3; i3++){
if(!(validate184(data17[i3], {instancePath:instancePath+"/reads/" + i3,parentData:data17,parentDataProperty:i3,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate184.errors : vErrors.concat(validate184.errors);
errors = vErrors.length;
}
}
}
else {
const err26 = {instancePath:instancePath+"/reads",schemaPath:"#/properties/reads/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err26];
}
else {
vErrors.push(err26);
}
errors++;
}
}
if(data.until !== undefined){
if(!(validate98(data.until, {instancePath:instancePath+"/until",parentData:data,parentDataProperty:"until",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate98.errors : vErrors.concat(validate98.errors);
errors = vErrors.length;
}
}
if(data.atLeastSeconds !== undefined){
let data20 = data.atLeastSeconds;
if(!(((typeof data20 == "number") && (!(data20 % 1) && !isNaN(data20))) && (isFinite(data20)))){
const err27 = {instancePath:instancePath+"/atLeastSeconds",schemaPath:"#/properties/atLeastSeconds/type",keyword:"type",params:{type: "integer"},message:"must be integer"};
if(vErrors === null){
vErrors = [err27];
}
else {
vErrors.push(err27);
}
errors++;
}
if((typeof data20 == "number") && (isFinite(data20))){
if(data20 > 86400 || isNaN(data20)){
const err28 = {instancePath:instancePath+"/atLeastSeconds",schemaPath:"#/properties/atLeastSeconds/maximum",keyword:"maximum",params:{comparison: "<=", limit: 86400},message:"must be <= 86400"};
if(vErrors === null){
vErrors = [err28];
}
else {
vErrors.push(err28);
}
errors++;
}
if(data20 < 1 || isNaN(data20)){
const err29 = {instancePath:instancePath+"/atLeastSeconds",schemaPath:"#/properties/atLeastSeconds/minimum",keyword:"minimum",params:{comparison: ">=", limit: 1},message:"must be >= 1"};
if(vErrors === null){
vErrors = [err29];
}
else {
vErrors.push(err29);
}
errors++;
}
}
}
if(data.meanwhile !== undefined){
if(!(validate57(data.meanwhile, {instancePath:instancePath+"/meanwhile",parentData:data,parentDataProperty:"meanwhile",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.next !== undefined){
let data22 = data.next;
if(Array.isArray(data22)){
if(data22.length > 30){
const err30 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err30];
}
else {
vErrors.push(err30);
}
errors++;
}
const len4 = data22.length;
for(let i4=0; i4<len4; i4++){
if(!(validate136(data22[i4], {instancePath:instancePath+"/next/" + i4,parentData:data22,parentDataProperty:i4,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate136.errors : vErrors.concat(validate136.errors);
errors = vErrors.length;
}
}
}
else {
const err31 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err31];
}
else {
vErrors.push(err31);
}
errors++;
}
}
if(data.otherwise !== undefined){
if(!(validate106(data.otherwise, {instancePath:instancePath+"/otherwise",parentData:data,parentDataProperty:"otherwise",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
if(data.results !== undefined){
let data25 = data.results;
if(Array.isArray(data25)){
if(data25.length > 30){
const err32 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err32];
}
else {
vErrors.push(err32);
}
errors++;
}
const len5 = data25.length;
for(let i5=0; i5<len5; i5++){
if(!(validate143(data25[i5], {instancePath:instancePath+"/results/" + i5,parentData:data25,parentDataProperty:i5,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate143.errors : vErrors.concat(validate143.errors);
errors = vErrors.length;
}
}
}
else {
const err33 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err33];
}
else {
vErrors.push(err33);
}
errors++;
}
}
if(data.cannotMeasure !== undefined){
if(!(validate106(data.cannotMeasure, {instancePath:instancePath+"/cannotMeasure",parentData:data,parentDataProperty:"cannotMeasure",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
}
else {
const err34 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err34];
}
else {
vErrors.push(err34);
}
errors++;
}
validate300.errors = vErrors;
return errors === 0;
}
validate300.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema64 = {"type":"object","properties":{"kind":{"const":"codes"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"name":{"$ref":"#/$defs/name"},"comparedWith":{"$ref":"#/$defs/name"},"newCodes":{"$ref":"#/$defs/name"},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"cannotMeasure":{"$ref":"#/$defs/exit"}},"required":["id","number","title","action","kind","otherwise","cannotMeasure","name"],"additionalProperties":false};

function validate319(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate319.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.id === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.number === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "number"},message:"must have required property '"+"number"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.title === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "title"},message:"must have required property '"+"title"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.action === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "action"},message:"must have required property '"+"action"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.kind === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "kind"},message:"must have required property '"+"kind"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(data.otherwise === undefined){
const err5 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "otherwise"},message:"must have required property '"+"otherwise"+"'"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
if(data.cannotMeasure === undefined){
const err6 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "cannotMeasure"},message:"must have required property '"+"cannotMeasure"+"'"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(data.name === undefined){
const err7 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
for(const key0 in data){
if(!(func1.call(schema64.properties, key0))){
const err8 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
}
if(data.kind !== undefined){
if("codes" !== data.kind){
const err9 = {instancePath:instancePath+"/kind",schemaPath:"#/properties/kind/const",keyword:"const",params:{allowedValue: "codes"},message:"must be equal to constant"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
if(data.id !== undefined){
if(!(validate84(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.number !== undefined){
let data2 = data.number;
if(typeof data2 === "string"){
if(func2(data2) > 8){
const err10 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/maxLength",keyword:"maxLength",params:{limit: 8},message:"must NOT have more than 8 characters"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
if(!pattern9.test(data2)){
const err11 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z0-9]+$"},message:"must match pattern \""+"^[A-Za-z0-9]+$"+"\""};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
}
else {
const err12 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
}
if(data.title !== undefined){
if(!(validate55(data.title, {instancePath:instancePath+"/title",parentData:data,parentDataProperty:"title",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.action !== undefined){
if(!(validate61(data.action, {instancePath:instancePath+"/action",parentData:data,parentDataProperty:"action",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.short !== undefined){
if(!(validate55(data.short, {instancePath:instancePath+"/short",parentData:data,parentDataProperty:"short",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.notes !== undefined){
let data6 = data.notes;
if(Array.isArray(data6)){
if(data6.length > 10){
const err13 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/maxItems",keyword:"maxItems",params:{limit: 10},message:"must NOT have more than 10 items"};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
if(data6.length < 1){
const err14 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err14];
}
else {
vErrors.push(err14);
}
errors++;
}
const len0 = data6.length;
for(let i0=0; i0<len0; i0++){
if(!(validate57(data6[i0], {instancePath:instancePath+"/notes/" + i0,parentData:data6,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
}
else {
const err15 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err15];
}
else {
vErrors.push(err15);
}
errors++;
}
}
if(data.why !== undefined){
if(!(validate57(data.why, {instancePath:instancePath+"/why",parentData:data,parentDataProperty:"why",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.cautions !== undefined){
let data9 = data.cautions;
if(Array.isArray(data9)){
if(data9.length > 12){
const err16 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err16];
}
else {
vErrors.push(err16);
}
errors++;
}
const len1 = data9.length;
for(let i1=0; i1<len1; i1++){
if(!(validate92(data9[i1], {instancePath:instancePath+"/cautions/" + i1,parentData:data9,parentDataProperty:i1,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate92.errors : vErrors.concat(validate92.errors);
errors = vErrors.length;
}
}
}
else {
const err17 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err17];
}
else {
vErrors.push(err17);
}
errors++;
}
}
if(data.picture !== undefined){
if(!(validate120(data.picture, {instancePath:instancePath+"/picture",parentData:data,parentDataProperty:"picture",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate120.errors : vErrors.concat(validate120.errors);
errors = vErrors.length;
}
}
if(data.disturbs !== undefined){
let data12 = data.disturbs;
if(Array.isArray(data12)){
if(data12.length > 12){
const err18 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err18];
}
else {
vErrors.push(err18);
}
errors++;
}
if(data12.length < 1){
const err19 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err19];
}
else {
vErrors.push(err19);
}
errors++;
}
const len2 = data12.length;
for(let i2=0; i2<len2; i2++){
if(!(validate125(data12[i2], {instancePath:instancePath+"/disturbs/" + i2,parentData:data12,parentDataProperty:i2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate125.errors : vErrors.concat(validate125.errors);
errors = vErrors.length;
}
}
}
else {
const err20 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err20];
}
else {
vErrors.push(err20);
}
errors++;
}
}
if(data.stay !== undefined){
if(typeof data.stay !== "boolean"){
const err21 = {instancePath:instancePath+"/stay",schemaPath:"#/properties/stay/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err21];
}
else {
vErrors.push(err21);
}
errors++;
}
}
if(data.release !== undefined){
if(!(validate130(data.release, {instancePath:instancePath+"/release",parentData:data,parentDataProperty:"release",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate130.errors : vErrors.concat(validate130.errors);
errors = vErrors.length;
}
}
if(data.verify !== undefined){
if(!(validate133(data.verify, {instancePath:instancePath+"/verify",parentData:data,parentDataProperty:"verify",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate133.errors : vErrors.concat(validate133.errors);
errors = vErrors.length;
}
}
if(data.name !== undefined){
if(!(validate66(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.comparedWith !== undefined){
if(!(validate66(data.comparedWith, {instancePath:instancePath+"/comparedWith",parentData:data,parentDataProperty:"comparedWith",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.newCodes !== undefined){
if(!(validate66(data.newCodes, {instancePath:instancePath+"/newCodes",parentData:data,parentDataProperty:"newCodes",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.next !== undefined){
let data20 = data.next;
if(Array.isArray(data20)){
if(data20.length > 30){
const err22 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err22];
}
else {
vErrors.push(err22);
}
errors++;
}
const len3 = data20.length;
for(let i3=0; i3<len3; i3++){
if(!(validate136(data20[i3], {instancePath:instancePath+"/next/" + i3,parentData:data20,parentDataProperty:i3,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate136.errors : vErrors.concat(validate136.errors);
errors = vErrors.length;
}
}
}
else {
const err23 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err23];
}
else {
vErrors.push(err23);
}
errors++;
}
}
if(data.otherwise !== undefined){
if(!(validate106(data.otherwise, {instancePath:instancePath+"/otherwise",parentData:data,parentDataProperty:"otherwise",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
if(data.results !== undefined){
let data23 = data.results;
if(Array.isArray(data23)){
if(data23.length > 30){
const err24 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err24];
}
else {
vErrors.push(err24);
}
errors++;
}
const len4 = data23.length;
for(let i4=0; i4<len4; i4++){
if(!(validate143(data23[i4], {instancePath:instancePath+"/results/" + i4,parentData:data23,parentDataProperty:i4,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate143.errors : vErrors.concat(validate143.errors);
errors = vErrors.length;
}
}
}
else {
const err25 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err25];
}
else {
vErrors.push(err25);
}
errors++;
}
}
if(data.cannotMeasure !== undefined){
if(!(validate106(data.cannotMeasure, {instancePath:instancePath+"/cannotMeasure",parentData:data,parentDataProperty:"cannotMeasure",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
}
else {
const err26 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err26];
}
else {
vErrors.push(err26);
}
errors++;
}
validate319.errors = vErrors;
return errors === 0;
}
validate319.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema65 = {"type":"object","properties":{"kind":{"const":"drive"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"name":{"$ref":"#/$defs/name"},"windows":{"type":"array","items":{"$ref":"#/$defs/driveWindow"},"minItems":1,"maxItems":20},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"cannotMeasure":{"$ref":"#/$defs/exit"}},"required":["id","number","title","action","kind","otherwise","cannotMeasure","name","windows"],"additionalProperties":false};
const schema66 = {"type":"object","properties":{"name":{"$ref":"#/$defs/name"},"label":{"$ref":"#/$defs/label"},"what":{"$ref":"#/$defs/line"}},"required":["name","label","what"],"additionalProperties":false};

function validate351(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate351.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.name === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.label === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "label"},message:"must have required property '"+"label"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.what === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "what"},message:"must have required property '"+"what"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
for(const key0 in data){
if(!(((key0 === "name") || (key0 === "label")) || (key0 === "what"))){
const err3 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
}
if(data.name !== undefined){
if(!(validate66(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.label !== undefined){
if(!(validate55(data.label, {instancePath:instancePath+"/label",parentData:data,parentDataProperty:"label",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.what !== undefined){
if(!(validate61(data.what, {instancePath:instancePath+"/what",parentData:data,parentDataProperty:"what",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
}
else {
const err4 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
validate351.errors = vErrors;
return errors === 0;
}
validate351.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};


function validate338(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate338.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.id === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.number === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "number"},message:"must have required property '"+"number"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.title === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "title"},message:"must have required property '"+"title"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.action === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "action"},message:"must have required property '"+"action"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.kind === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "kind"},message:"must have required property '"+"kind"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(data.otherwise === undefined){
const err5 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "otherwise"},message:"must have required property '"+"otherwise"+"'"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
if(data.cannotMeasure === undefined){
const err6 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "cannotMeasure"},message:"must have required property '"+"cannotMeasure"+"'"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(data.name === undefined){
const err7 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
if(data.windows === undefined){
const err8 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "windows"},message:"must have required property '"+"windows"+"'"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
for(const key0 in data){
if(!(func1.call(schema65.properties, key0))){
const err9 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
if(data.kind !== undefined){
if("drive" !== data.kind){
const err10 = {instancePath:instancePath+"/kind",schemaPath:"#/properties/kind/const",keyword:"const",params:{allowedValue: "drive"},message:"must be equal to constant"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
if(data.id !== undefined){
if(!(validate84(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.number !== undefined){
let data2 = data.number;
if(typeof data2 === "string"){
if(func2(data2) > 8){
const err11 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/maxLength",keyword:"maxLength",params:{limit: 8},message:"must NOT have more than 8 characters"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
if(!pattern9.test(data2)){
const err12 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z0-9]+$"},message:"must match pattern \""+"^[A-Za-z0-9]+$"+"\""};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
}
else {
const err13 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
}
if(data.title !== undefined){
if(!(validate55(data.title, {instancePath:instancePath+"/title",parentData:data,parentDataProperty:"title",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.action !== undefined){
if(!(validate61(data.action, {instancePath:instancePath+"/action",parentData:data,parentDataProperty:"action",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.short !== undefined){
if(!(validate55(data.short, {instancePath:instancePath+"/short",parentData:data,parentDataProperty:"short",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.notes !== undefined){
let data6 = data.notes;
if(Array.isArray(data6)){
if(data6.length > 10){
const err14 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/maxItems",keyword:"maxItems",params:{limit: 10},message:"must NOT have more than 10 items"};
if(vErrors === null){
vErrors = [err14];
}
else {
vErrors.push(err14);
}
errors++;
}
if(data6.length < 1){
const err15 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err15];
}
else {
vErrors.push(err15);
}
errors++;
}
const len0 = data6.length;
for(let i0=0; i0<len0; i0++){
if(!(validate57(data6[i0], {instancePath:instancePath+"/notes/" + i0,parentData:data6,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
}
else {
const err16 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err16];
}
else {
vErrors.push(err16);
}
errors++;
}
}
if(data.why !== undefined){
if(!(validate57(data.why, {instancePath:instancePath+"/why",parentData:data,parentDataProperty:"why",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.cautions !== undefined){
let data9 = data.cautions;
if(Array.isArray(data9)){
if(data9.length > 12){
const err17 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err17];
}
else {
vErrors.push(err17);
}
errors++;
}
const len1 = data9.length;
for(let i1=0; i1<len1; i1++){
if(!(validate92(data9[i1], {instancePath:instancePath+"/cautions/" + i1,parentData:data9,parentDataProperty:i1,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate92.errors : vErrors.concat(validate92.errors);
errors = vErrors.length;
}
}
}
else {
const err18 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err18];
}
else {
vErrors.push(err18);
}
errors++;
}
}
if(data.picture !== undefined){
if(!(validate120(data.picture, {instancePath:instancePath+"/picture",parentData:data,parentDataProperty:"picture",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate120.errors : vErrors.concat(validate120.errors);
errors = vErrors.length;
}
}
if(data.disturbs !== undefined){
let data12 = data.disturbs;
if(Array.isArray(data12)){
if(data12.length > 12){
const err19 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err19];
}
else {
vErrors.push(err19);
}
errors++;
}
if(data12.length < 1){
const err20 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err20];
}
else {
vErrors.push(err20);
}
errors++;
}
const len2 = data12.length;
for(let i2=0; i2<len2; i2++){
if(!(validate125(data12[i2], {instancePath:instancePath+"/disturbs/" + i2,parentData:data12,parentDataProperty:i2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate125.errors : vErrors.concat(validate125.errors);
errors = vErrors.length;
}
}
}
else {
const err21 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err21];
}
else {
vErrors.push(err21);
}
errors++;
}
}
if(data.stay !== undefined){
if(typeof data.stay !== "boolean"){
const err22 = {instancePath:instancePath+"/stay",schemaPath:"#/properties/stay/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err22];
}
else {
vErrors.push(err22);
}
errors++;
}
}
if(data.release !== undefined){
if(!(validate130(data.release, {instancePath:instancePath+"/release",parentData:data,parentDataProperty:"release",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate130.errors : vErrors.concat(validate130.errors);
errors = vErrors.length;
}
}
if(data.verify !== undefined){
if(!(validate133(data.verify, {instancePath:instancePath+"/verify",parentData:data,parentDataProperty:"verify",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate133.errors : vErrors.concat(validate133.errors);
errors = vErrors.length;
}
}
if(data.name !== undefined){
if(!(validate66(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.windows !== undefined){
let data18 = data.windows;
if(Array.isArray(data18)){
if(data18.length > 20){
const err23 = {instancePath:instancePath+"/windows",schemaPath:"#/properties/windows/maxItems",keyword:"maxItems",params:{limit: 20},message:"must NOT have more than 20 items"};
if(vErrors === null){
vErrors = [err23];
}
else {
vErrors.push(err23);
}
errors++;
}
if(data18.length < 1){
const err24 = {instancePath:instancePath+"/windows",schemaPath:"#/properties/windows/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err24];
}
else {
vErrors.push(err24);
}
errors++;
}
const len3 = data18.length;
for(let i3=0; i3<len3; i3++){
if(!(validate351(data18[i3], {instancePath:instancePath+"/windows/" + i3,parentData:data18,parentDataProperty:i3,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate351.errors : vErrors.concat(validate351.errors);
errors = vErrors.length;
}
}
}
else {
const err25 = {instancePath:instancePath+"/windows",schemaPath:"#/properties/windows/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err25];
}
else {
vErrors.push(err25);
}
errors++;
}
}
if(data.next !== undefined){
let data20 = data.next;
if(Array.isArray(data20)){
if(data20.length > 30){
const err26 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err26];
}
else {
vErrors.push(err26);
}
errors++;
}
const len4 = data20.length;
for(let i4=0; i4<len4; i4++){
if(!(validate136(data20[i4], {instancePath:instancePath+"/next/" + i4,parentData:data20,parentDataProperty:i4,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate136.errors : vErrors.concat(validate136.errors);
errors = vErrors.length;
}
}
}
else {
const err27 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err27];
}
else {
vErrors.push(err27);
}
errors++;
}
}
if(data.otherwise !== undefined){
if(!(validate106(data.otherwise, {instancePath:instancePath+"/otherwise",parentData:data,parentDataProperty:"otherwise",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
if(data.results !== undefined){
let data23 = data.results;
if(Array.isArray(data23)){
if(data23.length > 30){
const err28 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err28];
}
else {
vErrors.push(err28);
}
errors++;
}
const len5 = data23.length;
for(let i5=0; i5<len5; i5++){
if(!(validate143(data23[i5], {instancePath:instancePath+"/results/" + i5,parentData:data23,parentDataProperty:i5,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate143.errors : vErrors.concat(validate143.errors);
errors = vErrors.length;
}
}
}
else {
const err29 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err29];
}
else {
vErrors.push(err29);
}
errors++;
}
}
if(data.cannotMeasure !== undefined){
if(!(validate106(data.cannotMeasure, {instancePath:instancePath+"/cannotMeasure",parentData:data,parentDataProperty:"cannotMeasure",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
}
else {
const err30 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err30];
}
else {
vErrors.push(err30);
}
errors++;
}
validate338.errors = vErrors;
return errors === 0;
}
validate338.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema67 = {"type":"object","properties":{"kind":{"const":"compute"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30}},"required":["id","number","title","action","kind","otherwise"],"additionalProperties":false};

function validate360(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate360.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.id === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.number === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "number"},message:"must have required property '"+"number"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.title === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "title"},message:"must have required property '"+"title"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.action === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "action"},message:"must have required property '"+"action"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.kind === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "kind"},message:"must have required property '"+"kind"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(data.otherwise === undefined){
const err5 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "otherwise"},message:"must have required property '"+"otherwise"+"'"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
for(const key0 in data){
if(!(func1.call(schema67.properties, key0))){
const err6 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
}
if(data.kind !== undefined){
if("compute" !== data.kind){
const err7 = {instancePath:instancePath+"/kind",schemaPath:"#/properties/kind/const",keyword:"const",params:{allowedValue: "compute"},message:"must be equal to constant"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
}
if(data.id !== undefined){
if(!(validate84(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.number !== undefined){
let data2 = data.number;
if(typeof data2 === "string"){
if(func2(data2) > 8){
const err8 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/maxLength",keyword:"maxLength",params:{limit: 8},message:"must NOT have more than 8 characters"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
if(!pattern9.test(data2)){
const err9 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z0-9]+$"},message:"must match pattern \""+"^[A-Za-z0-9]+$"+"\""};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
else {
const err10 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
if(data.title !== undefined){
if(!(validate55(data.title, {instancePath:instancePath+"/title",parentData:data,parentDataProperty:"title",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.action !== undefined){
if(!(validate61(data.action, {instancePath:instancePath+"/action",parentData:data,parentDataProperty:"action",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.short !== undefined){
if(!(validate55(data.short, {instancePath:instancePath+"/short",parentData:data,parentDataProperty:"short",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.notes !== undefined){
let data6 = data.notes;
if(Array.isArray(data6)){
if(data6.length > 10){
const err11 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/maxItems",keyword:"maxItems",params:{limit: 10},message:"must NOT have more than 10 items"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
if(data6.length < 1){
const err12 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
const len0 = data6.length;
for(let i0=0; i0<len0; i0++){
if(!(validate57(data6[i0], {instancePath:instancePath+"/notes/" + i0,parentData:data6,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
}
else {
const err13 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
}
if(data.why !== undefined){
if(!(validate57(data.why, {instancePath:instancePath+"/why",parentData:data,parentDataProperty:"why",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.cautions !== undefined){
let data9 = data.cautions;
if(Array.isArray(data9)){
if(data9.length > 12){
const err14 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err14];
}
else {
vErrors.push(err14);
}
errors++;
}
const len1 = data9.length;
for(let i1=0; i1<len1; i1++){
if(!(validate92(data9[i1], {instancePath:instancePath+"/cautions/" + i1,parentData:data9,parentDataProperty:i1,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate92.errors : vErrors.concat(validate92.errors);
errors = vErrors.length;
}
}
}
else {
const err15 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err15];
}
else {
vErrors.push(err15);
}
errors++;
}
}
if(data.picture !== undefined){
if(!(validate120(data.picture, {instancePath:instancePath+"/picture",parentData:data,parentDataProperty:"picture",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate120.errors : vErrors.concat(validate120.errors);
errors = vErrors.length;
}
}
if(data.disturbs !== undefined){
let data12 = data.disturbs;
if(Array.isArray(data12)){
if(data12.length > 12){
const err16 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err16];
}
else {
vErrors.push(err16);
}
errors++;
}
if(data12.length < 1){
const err17 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err17];
}
else {
vErrors.push(err17);
}
errors++;
}
const len2 = data12.length;
for(let i2=0; i2<len2; i2++){
if(!(validate125(data12[i2], {instancePath:instancePath+"/disturbs/" + i2,parentData:data12,parentDataProperty:i2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate125.errors : vErrors.concat(validate125.errors);
errors = vErrors.length;
}
}
}
else {
const err18 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err18];
}
else {
vErrors.push(err18);
}
errors++;
}
}
if(data.stay !== undefined){
if(typeof data.stay !== "boolean"){
const err19 = {instancePath:instancePath+"/stay",schemaPath:"#/properties/stay/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err19];
}
else {
vErrors.push(err19);
}
errors++;
}
}
if(data.release !== undefined){
if(!(validate130(data.release, {instancePath:instancePath+"/release",parentData:data,parentDataProperty:"release",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate130.errors : vErrors.concat(validate130.errors);
errors = vErrors.length;
}
}
if(data.verify !== undefined){
if(!(validate133(data.verify, {instancePath:instancePath+"/verify",parentData:data,parentDataProperty:"verify",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate133.errors : vErrors.concat(validate133.errors);
errors = vErrors.length;
}
}
if(data.next !== undefined){
let data17 = data.next;
if(Array.isArray(data17)){
if(data17.length > 30){
const err20 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err20];
}
else {
vErrors.push(err20);
}
errors++;
}
const len3 = data17.length;
for(let i3=0; i3<len3; i3++){
if(!(validate136(data17[i3], {instancePath:instancePath+"/next/" + i3,parentData:data17,parentDataProperty:i3,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate136.errors : vErrors.concat(validate136.errors);
errors = vErrors.length;
}
}
}
else {
const err21 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err21];
}
else {
vErrors.push(err21);
}
errors++;
}
}
if(data.otherwise !== undefined){
if(!(validate106(data.otherwise, {instancePath:instancePath+"/otherwise",parentData:data,parentDataProperty:"otherwise",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
if(data.results !== undefined){
let data20 = data.results;
if(Array.isArray(data20)){
if(data20.length > 30){
const err22 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err22];
}
else {
vErrors.push(err22);
}
errors++;
}
const len4 = data20.length;
for(let i4=0; i4<len4; i4++){
if(!(validate143(data20[i4], {instancePath:instancePath+"/results/" + i4,parentData:data20,parentDataProperty:i4,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate143.errors : vErrors.concat(validate143.errors);
errors = vErrors.length;
}
}
}
else {
const err23 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err23];
}
else {
vErrors.push(err23);
}
errors++;
}
}
}
else {
const err24 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err24];
}
else {
vErrors.push(err24);
}
errors++;
}
validate360.errors = vErrors;
return errors === 0;
}
validate360.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema68 = {"type":"object","properties":{"kind":{"const":"restore"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30}},"required":["id","number","title","action","kind","otherwise"],"additionalProperties":false};

function validate375(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate375.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.id === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.number === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "number"},message:"must have required property '"+"number"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.title === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "title"},message:"must have required property '"+"title"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.action === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "action"},message:"must have required property '"+"action"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.kind === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "kind"},message:"must have required property '"+"kind"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(data.otherwise === undefined){
const err5 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "otherwise"},message:"must have required property '"+"otherwise"+"'"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
for(const key0 in data){
if(!(func1.call(schema68.properties, key0))){
const err6 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
}
if(data.kind !== undefined){
if("restore" !== data.kind){
const err7 = {instancePath:instancePath+"/kind",schemaPath:"#/properties/kind/const",keyword:"const",params:{allowedValue: "restore"},message:"must be equal to constant"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
}
if(data.id !== undefined){
if(!(validate84(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.number !== undefined){
let data2 = data.number;
if(typeof data2 === "string"){
if(func2(data2) > 8){
const err8 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/maxLength",keyword:"maxLength",params:{limit: 8},message:"must NOT have more than 8 characters"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
if(!pattern9.test(data2)){
const err9 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z0-9]+$"},message:"must match pattern \""+"^[A-Za-z0-9]+$"+"\""};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
else {
const err10 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
if(data.title !== undefined){
if(!(validate55(data.title, {instancePath:instancePath+"/title",parentData:data,parentDataProperty:"title",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.action !== undefined){
if(!(validate61(data.action, {instancePath:instancePath+"/action",parentData:data,parentDataProperty:"action",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.short !== undefined){
if(!(validate55(data.short, {instancePath:instancePath+"/short",parentData:data,parentDataProperty:"short",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.notes !== undefined){
let data6 = data.notes;
if(Array.isArray(data6)){
if(data6.length > 10){
const err11 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/maxItems",keyword:"maxItems",params:{limit: 10},message:"must NOT have more than 10 items"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
if(data6.length < 1){
const err12 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
const len0 = data6.length;
for(let i0=0; i0<len0; i0++){
if(!(validate57(data6[i0], {instancePath:instancePath+"/notes/" + i0,parentData:data6,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
}
else {
const err13 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
}
if(data.why !== undefined){
if(!(validate57(data.why, {instancePath:instancePath+"/why",parentData:data,parentDataProperty:"why",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.cautions !== undefined){
let data9 = data.cautions;
if(Array.isArray(data9)){
if(data9.length > 12){
const err14 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err14];
}
else {
vErrors.push(err14);
}
errors++;
}
const len1 = data9.length;
for(let i1=0; i1<len1; i1++){
if(!(validate92(data9[i1], {instancePath:instancePath+"/cautions/" + i1,parentData:data9,parentDataProperty:i1,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate92.errors : vErrors.concat(validate92.errors);
errors = vErrors.length;
}
}
}
else {
const err15 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err15];
}
else {
vErrors.push(err15);
}
errors++;
}
}
if(data.picture !== undefined){
if(!(validate120(data.picture, {instancePath:instancePath+"/picture",parentData:data,parentDataProperty:"picture",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate120.errors : vErrors.concat(validate120.errors);
errors = vErrors.length;
}
}
if(data.disturbs !== undefined){
let data12 = data.disturbs;
if(Array.isArray(data12)){
if(data12.length > 12){
const err16 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err16];
}
else {
vErrors.push(err16);
}
errors++;
}
if(data12.length < 1){
const err17 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err17];
}
else {
vErrors.push(err17);
}
errors++;
}
const len2 = data12.length;
for(let i2=0; i2<len2; i2++){
if(!(validate125(data12[i2], {instancePath:instancePath+"/disturbs/" + i2,parentData:data12,parentDataProperty:i2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate125.errors : vErrors.concat(validate125.errors);
errors = vErrors.length;
}
}
}
else {
const err18 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err18];
}
else {
vErrors.push(err18);
}
errors++;
}
}
if(data.stay !== undefined){
if(typeof data.stay !== "boolean"){
const err19 = {instancePath:instancePath+"/stay",schemaPath:"#/properties/stay/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err19];
}
else {
vErrors.push(err19);
}
errors++;
}
}
if(data.release !== undefined){
if(!(validate130(data.release, {instancePath:instancePath+"/release",parentData:data,parentDataProperty:"release",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate130.errors : vErrors.concat(validate130.errors);
errors = vErrors.length;
}
}
if(data.verify !== undefined){
if(!(validate133(data.verify, {instancePath:instancePath+"/verify",parentData:data,parentDataProperty:"verify",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate133.errors : vErrors.concat(validate133.errors);
errors = vErrors.length;
}
}
if(data.next !== undefined){
let data17 = data.next;
if(Array.isArray(data17)){
if(data17.length > 30){
const err20 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err20];
}
else {
vErrors.push(err20);
}
errors++;
}
const len3 = data17.length;
for(let i3=0; i3<len3; i3++){
if(!(validate136(data17[i3], {instancePath:instancePath+"/next/" + i3,parentData:data17,parentDataProperty:i3,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate136.errors : vErrors.concat(validate136.errors);
errors = vErrors.length;
}
}
}
else {
const err21 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err21];
}
else {
vErrors.push(err21);
}
errors++;
}
}
if(data.otherwise !== undefined){
if(!(validate106(data.otherwise, {instancePath:instancePath+"/otherwise",parentData:data,parentDataProperty:"otherwise",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
if(data.results !== undefined){
let data20 = data.results;
if(Array.isArray(data20)){
if(data20.length > 30){
const err22 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err22];
}
else {
vErrors.push(err22);
}
errors++;
}
const len4 = data20.length;
for(let i4=0; i4<len4; i4++){
if(!(validate143(data20[i4], {instancePath:instancePath+"/results/" + i4,parentData:data20,parentDataProperty:i4,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate143.errors : vErrors.concat(validate143.errors);
errors = vErrors.length;
}
}
}
else {
const err23 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err23];
}
else {
vErrors.push(err23);
}
errors++;
}
}
}
else {
const err24 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err24];
}
else {
vErrors.push(err24);
}
errors++;
}
validate375.errors = vErrors;
return errors === 0;
}
validate375.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema69 = {"type":"object","properties":{"kind":{"const":"finding"},"id":{"$ref":"#/$defs/name"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"result":{"enum":["in","out","too-close","not-judged"]},"verdict":{"$ref":"#/$defs/paragraph"},"cause":{"type":"array","items":{"$ref":"#/$defs/sentence"},"maxItems":60},"correction":{"type":"array","items":{"$ref":"#/$defs/sentence"},"maxItems":60},"customer":{"type":"array","items":{"$ref":"#/$defs/sentence"},"maxItems":60},"nextProcedure":{"$ref":"#/$defs/procedureId"}},"required":["id","number","title","action","kind","result","verdict","cause","correction","customer"],"additionalProperties":false};
const schema70 = {"type":"object","properties":{"text":{"$ref":"#/$defs/paragraph"},"when":{"$ref":"#/$defs/expression"}},"required":["text"],"additionalProperties":false};

function validate403(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate403.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.text === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "text"},message:"must have required property '"+"text"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "text") || (key0 === "when"))){
const err1 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
if(data.text !== undefined){
if(!(validate57(data.text, {instancePath:instancePath+"/text",parentData:data,parentDataProperty:"text",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.when !== undefined){
if(!(validate98(data.when, {instancePath:instancePath+"/when",parentData:data,parentDataProperty:"when",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate98.errors : vErrors.concat(validate98.errors);
errors = vErrors.length;
}
}
}
else {
const err2 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
validate403.errors = vErrors;
return errors === 0;
}
validate403.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};


function validate390(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate390.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.id === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.number === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "number"},message:"must have required property '"+"number"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.title === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "title"},message:"must have required property '"+"title"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.action === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "action"},message:"must have required property '"+"action"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.kind === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "kind"},message:"must have required property '"+"kind"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(data.result === undefined){
const err5 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "result"},message:"must have required property '"+"result"+"'"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
if(data.verdict === undefined){
const err6 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "verdict"},message:"must have required property '"+"verdict"+"'"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(data.cause === undefined){
const err7 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "cause"},message:"must have required property '"+"cause"+"'"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
if(data.correction === undefined){
const err8 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "correction"},message:"must have required property '"+"correction"+"'"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
if(data.customer === undefined){
const err9 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "customer"},message:"must have required property '"+"customer"+"'"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
for(const key0 in data){
if(!(func1.call(schema69.properties, key0))){
const err10 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
if(data.kind !== undefined){
if("finding" !== data.kind){
const err11 = {instancePath:instancePath+"/kind",schemaPath:"#/properties/kind/const",keyword:"const",params:{allowedValue: "finding"},message:"must be equal to constant"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
}
if(data.id !== undefined){
if(!(validate66(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.number !== undefined){
let data2 = data.number;
if(typeof data2 === "string"){
if(func2(data2) > 8){
const err12 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/maxLength",keyword:"maxLength",params:{limit: 8},message:"must NOT have more than 8 characters"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
if(!pattern9.test(data2)){
const err13 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z0-9]+$"},message:"must match pattern \""+"^[A-Za-z0-9]+$"+"\""};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
}
else {
const err14 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err14];
}
else {
vErrors.push(err14);
}
errors++;
}
}
if(data.title !== undefined){
if(!(validate55(data.title, {instancePath:instancePath+"/title",parentData:data,parentDataProperty:"title",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.action !== undefined){
if(!(validate61(data.action, {instancePath:instancePath+"/action",parentData:data,parentDataProperty:"action",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.short !== undefined){
if(!(validate55(data.short, {instancePath:instancePath+"/short",parentData:data,parentDataProperty:"short",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.notes !== undefined){
let data6 = data.notes;
if(Array.isArray(data6)){
if(data6.length > 10){
const err15 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/maxItems",keyword:"maxItems",params:{limit: 10},message:"must NOT have more than 10 items"};
if(vErrors === null){
vErrors = [err15];
}
else {
vErrors.push(err15);
}
errors++;
}
if(data6.length < 1){
const err16 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err16];
}
else {
vErrors.push(err16);
}
errors++;
}
const len0 = data6.length;
for(let i0=0; i0<len0; i0++){
if(!(validate57(data6[i0], {instancePath:instancePath+"/notes/" + i0,parentData:data6,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
}
else {
const err17 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err17];
}
else {
vErrors.push(err17);
}
errors++;
}
}
if(data.why !== undefined){
if(!(validate57(data.why, {instancePath:instancePath+"/why",parentData:data,parentDataProperty:"why",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.cautions !== undefined){
let data9 = data.cautions;
if(Array.isArray(data9)){
if(data9.length > 12){
const err18 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err18];
}
else {
vErrors.push(err18);
}
errors++;
}
const len1 = data9.length;
for(let i1=0; i1<len1; i1++){
if(!(validate92(data9[i1], {instancePath:instancePath+"/cautions/" + i1,parentData:data9,parentDataProperty:i1,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate92.errors : vErrors.concat(validate92.errors);
errors = vErrors.length;
}
}
}
else {
const err19 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err19];
}
else {
vErrors.push(err19);
}
errors++;
}
}
if(data.picture !== undefined){
if(!(validate120(data.picture, {instancePath:instancePath+"/picture",parentData:data,parentDataProperty:"picture",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate120.errors : vErrors.concat(validate120.errors);
errors = vErrors.length;
}
}
if(data.disturbs !== undefined){
let data12 = data.disturbs;
if(Array.isArray(data12)){
if(data12.length > 12){
const err20 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err20];
}
else {
vErrors.push(err20);
}
errors++;
}
if(data12.length < 1){
const err21 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err21];
}
else {
vErrors.push(err21);
}
errors++;
}
const len2 = data12.length;
for(let i2=0; i2<len2; i2++){
if(!(validate125(data12[i2], {instancePath:instancePath+"/disturbs/" + i2,parentData:data12,parentDataProperty:i2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate125.errors : vErrors.concat(validate125.errors);
errors = vErrors.length;
}
}
}
else {
const err22 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err22];
}
else {
vErrors.push(err22);
}
errors++;
}
}
if(data.stay !== undefined){
if(typeof data.stay !== "boolean"){
const err23 = {instancePath:instancePath+"/stay",schemaPath:"#/properties/stay/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err23];
}
else {
vErrors.push(err23);
}
errors++;
}
}
if(data.release !== undefined){
if(!(validate130(data.release, {instancePath:instancePath+"/release",parentData:data,parentDataProperty:"release",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate130.errors : vErrors.concat(validate130.errors);
errors = vErrors.length;
}
}
if(data.verify !== undefined){
if(!(validate133(data.verify, {instancePath:instancePath+"/verify",parentData:data,parentDataProperty:"verify",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate133.errors : vErrors.concat(validate133.errors);
errors = vErrors.length;
}
}
if(data.result !== undefined){
let data17 = data.result;
if(!((((data17 === "in") || (data17 === "out")) || (data17 === "too-close")) || (data17 === "not-judged"))){
const err24 = {instancePath:instancePath+"/result",schemaPath:"#/properties/result/enum",keyword:"enum",params:{allowedValues: schema69.properties.result.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err24];
}
else {
vErrors.push(err24);
}
errors++;
}
}
if(data.verdict !== undefined){
if(!(validate57(data.verdict, {instancePath:instancePath+"/verdict",parentData:data,parentDataProperty:"verdict",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.cause !== undefined){
let data19 = data.cause;
if(Array.isArray(data19)){
if(data19.length > 60){
const err25 = {instancePath:instancePath+"/cause",schemaPath:"#/properties/cause/maxItems",keyword:"maxItems",params:{limit: 60},message:"must NOT have more than 60 items"};
if(vErrors === null){
vErrors = [err25];
}
else {
vErrors.push(err25);
}
errors++;
}
const len3 = data19.length;
for(let i3=0; i3<len3; i3++){
if(!(validate403(data19[i3], {instancePath:instancePath+"/cause/" + i3,parentData:data19,parentDataProperty:i3,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate403.errors : vErrors.concat(validate403.errors);
errors = vErrors.length;
}
}
}
else {
const err26 = {instancePath:instancePath+"/cause",schemaPath:"#/properties/cause/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err26];
}
else {
vErrors.push(err26);
}
errors++;
}
}
if(data.correction !== undefined){
let data21 = data.correction;
if(Array.isArray(data21)){
if(data21.length > 60){
const err27 = {instancePath:instancePath+"/correction",schemaPath:"#/properties/correction/maxItems",keyword:"maxItems",params:{limit: 60},message:"must NOT have more than 60 items"};
if(vErrors === null){
vErrors = [err27];
}
else {
vErrors.push(err27);
}
errors++;
}
const len4 = data21.length;
for(let i4=0; i4<len4; i4++){
if(!(validate403(data21[i4], {instancePath:instancePath+"/correction/" + i4,parentData:data21,parentDataProperty:i4,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate403.errors : vErrors.concat(validate403.errors);
errors = vErrors.length;
}
}
}
else {
const err28 = {instancePath:instancePath+"/correction",schemaPath:"#/properties/correction/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err28];
}
else {
vErrors.push(err28);
}
errors++;
}
}
if(data.customer !== undefined){
let data23 = data.customer;
if(Array.isArray(data23)){
if(data23.length > 60){
const err29 = {instancePath:instancePath+"/customer",schemaPath:"#/properties/customer/maxItems",keyword:"maxItems",params:{limit: 60},message:"must NOT have more than 60 items"};
if(vErrors === null){
vErrors = [err29];
}
else {
vErrors.push(err29);
}
errors++;
}
const len5 = data23.length;
for(let i5=0; i5<len5; i5++){
if(!(validate403(data23[i5], {instancePath:instancePath+"/customer/" + i5,parentData:data23,parentDataProperty:i5,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate403.errors : vErrors.concat(validate403.errors);
errors = vErrors.length;
}
}
}
else {
const err30 = {instancePath:instancePath+"/customer",schemaPath:"#/properties/customer/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err30];
}
else {
vErrors.push(err30);
}
errors++;
}
}
if(data.nextProcedure !== undefined){
if(!(validate53(data.nextProcedure, {instancePath:instancePath+"/nextProcedure",parentData:data,parentDataProperty:"nextProcedure",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate53.errors : vErrors.concat(validate53.errors);
errors = vErrors.length;
}
}
}
else {
const err31 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err31];
}
else {
vErrors.push(err31);
}
errors++;
}
validate390.errors = vErrors;
return errors === 0;
}
validate390.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema71 = {"type":"object","properties":{"kind":{"const":"ramp"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"name":{"$ref":"#/$defs/name"},"channels":{"type":"array","items":{"$ref":"#/$defs/channel"},"minItems":1,"maxItems":4},"target":{"type":"number"},"finds":{"type":"array","items":{"$ref":"#/$defs/foundQuantity"},"minItems":1,"maxItems":20},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"cannotMeasure":{"$ref":"#/$defs/exit"}},"required":["id","number","title","action","kind","otherwise","cannotMeasure","name","channels","target","finds"],"additionalProperties":false};

function validate410(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate410.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.id === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.number === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "number"},message:"must have required property '"+"number"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.title === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "title"},message:"must have required property '"+"title"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.action === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "action"},message:"must have required property '"+"action"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.kind === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "kind"},message:"must have required property '"+"kind"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(data.otherwise === undefined){
const err5 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "otherwise"},message:"must have required property '"+"otherwise"+"'"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
if(data.cannotMeasure === undefined){
const err6 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "cannotMeasure"},message:"must have required property '"+"cannotMeasure"+"'"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(data.name === undefined){
const err7 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
if(data.channels === undefined){
const err8 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "channels"},message:"must have required property '"+"channels"+"'"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
if(data.target === undefined){
const err9 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "target"},message:"must have required property '"+"target"+"'"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
if(data.finds === undefined){
const err10 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "finds"},message:"must have required property '"+"finds"+"'"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
for(const key0 in data){
if(!(func1.call(schema71.properties, key0))){
const err11 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
}
if(data.kind !== undefined){
if("ramp" !== data.kind){
const err12 = {instancePath:instancePath+"/kind",schemaPath:"#/properties/kind/const",keyword:"const",params:{allowedValue: "ramp"},message:"must be equal to constant"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
}
if(data.id !== undefined){
if(!(validate84(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.number !== undefined){
let data2 = data.number;
if(typeof data2 === "string"){
if(func2(data2) > 8){
const err13 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/maxLength",keyword:"maxLength",params:{limit: 8},message:"must NOT have more than 8 characters"};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
if(!pattern9.test(data2)){
const err14 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z0-9]+$"},message:"must match pattern \""+"^[A-Za-z0-9]+$"+"\""};
if(vErrors === null){
vErrors = [err14];
}
else {
vErrors.push(err14);
}
errors++;
}
}
else {
const err15 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err15];
}
else {
vErrors.push(err15);
}
errors++;
}
}
if(data.title !== undefined){
if(!(validate55(data.title, {instancePath:instancePath+"/title",parentData:data,parentDataProperty:"title",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.action !== undefined){
if(!(validate61(data.action, {instancePath:instancePath+"/action",parentData:data,parentDataProperty:"action",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.short !== undefined){
if(!(validate55(data.short, {instancePath:instancePath+"/short",parentData:data,parentDataProperty:"short",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.notes !== undefined){
let data6 = data.notes;
if(Array.isArray(data6)){
if(data6.length > 10){
const err16 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/maxItems",keyword:"maxItems",params:{limit: 10},message:"must NOT have more than 10 items"};
if(vErrors === null){
vErrors = [err16];
}
else {
vErrors.push(err16);
}
errors++;
}
if(data6.length < 1){
const err17 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err17];
}
else {
vErrors.push(err17);
}
errors++;
}
const len0 = data6.length;
for(let i0=0; i0<len0; i0++){
if(!(validate57(data6[i0], {instancePath:instancePath+"/notes/" + i0,parentData:data6,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
}
else {
const err18 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err18];
}
else {
vErrors.push(err18);
}
errors++;
}
}
if(data.why !== undefined){
if(!(validate57(data.why, {instancePath:instancePath+"/why",parentData:data,parentDataProperty:"why",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.cautions !== undefined){
let data9 = data.cautions;
if(Array.isArray(data9)){
if(data9.length > 12){
const err19 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err19];
}
else {
vErrors.push(err19);
}
errors++;
}
const len1 = data9.length;
for(let i1=0; i1<len1; i1++){
if(!(validate92(data9[i1], {instancePath:instancePath+"/cautions/" + i1,parentData:data9,parentDataProperty:i1,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate92.errors : vErrors.concat(validate92.errors);
errors = vErrors.length;
}
}
}
else {
const err20 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err20];
}
else {
vErrors.push(err20);
}
errors++;
}
}
if(data.picture !== undefined){
if(!(validate120(data.picture, {instancePath:instancePath+"/picture",parentData:data,parentDataProperty:"picture",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate120.errors : vErrors.concat(validate120.errors);
errors = vErrors.length;
}
}
if(data.disturbs !== undefined){
let data12 = data.disturbs;
if(Array.isArray(data12)){
if(data12.length > 12){
const err21 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err21];
}
else {
vErrors.push(err21);
}
errors++;
}
if(data12.length < 1){
const err22 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err22];
}
else {
vErrors.push(err22);
}
errors++;
}
const len2 = data12.length;
for(let i2=0; i2<len2; i2++){
if(!(validate125(data12[i2], {instancePath:instancePath+"/disturbs/" + i2,parentData:data12,parentDataProperty:i2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate125.errors : vErrors.concat(validate125.errors);
errors = vErrors.length;
}
}
}
else {
const err23 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err23];
}
else {
vErrors.push(err23);
}
errors++;
}
}
if(data.stay !== undefined){
if(typeof data.stay !== "boolean"){
const err24 = {instancePath:instancePath+"/stay",schemaPath:"#/properties/stay/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err24];
}
else {
vErrors.push(err24);
}
errors++;
}
}
if(data.release !== undefined){
if(!(validate130(data.release, {instancePath:instancePath+"/release",parentData:data,parentDataProperty:"release",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate130.errors : vErrors.concat(validate130.errors);
errors = vErrors.length;
}
}
if(data.verify !== undefined){
if(!(validate133(data.verify, {instancePath:instancePath+"/verify",parentData:data,parentDataProperty:"verify",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate133.errors : vErrors.concat(validate133.errors);
errors = vErrors.length;
}
}
if(data.name !== undefined){
if(!(validate66(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.channels !== undefined){
let data18 = data.channels;
if(Array.isArray(data18)){
if(data18.length > 4){
const err25 = {instancePath:instancePath+"/channels",schemaPath:"#/properties/channels/maxItems",keyword:"maxItems",params:{limit: 4},message:"must NOT have more than 4 items"};
if(vErrors === null){
vErrors = [err25];
}
else {
vErrors.push(err25);
}
errors++;
}
if(data18.length < 1){
const err26 = {instancePath:instancePath+"/channels",schemaPath:"#/properties/channels/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err26];
}
else {
vErrors.push(err26);
}
errors++;
}
const len3 = data18.length;
for(let i3=0; i3<len3; i3++){
if(!(validate253(data18[i3], {instancePath:instancePath+"/channels/" + i3,parentData:data18,parentDataProperty:i3,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate253.errors : vErrors.concat(validate253.errors);
errors = vErrors.length;
}
}
}
else {
const err27 = {instancePath:instancePath+"/channels",schemaPath:"#/properties/channels/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err27];
}
else {
vErrors.push(err27);
}
errors++;
}
}
if(data.target !== undefined){
let data20 = data.target;
if(!((typeof data20 == "number") && (isFinite(data20)))){
const err28 = {instancePath:instancePath+"/target",schemaPath:"#/properties/target/type",keyword:"type",params:{type: "number"},message:"must be number"};
if(vErrors === null){
vErrors = [err28];
}
else {
vErrors.push(err28);
}
errors++;
}
}
if(data.finds !== undefined){
let data21 = data.finds;
if(Array.isArray(data21)){
if(data21.length > 20){
const err29 = {instancePath:instancePath+"/finds",schemaPath:"#/properties/finds/maxItems",keyword:"maxItems",params:{limit: 20},message:"must NOT have more than 20 items"};
if(vErrors === null){
vErrors = [err29];
}
else {
vErrors.push(err29);
}
errors++;
}
if(data21.length < 1){
const err30 = {instancePath:instancePath+"/finds",schemaPath:"#/properties/finds/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err30];
}
else {
vErrors.push(err30);
}
errors++;
}
const len4 = data21.length;
for(let i4=0; i4<len4; i4++){
if(!(validate262(data21[i4], {instancePath:instancePath+"/finds/" + i4,parentData:data21,parentDataProperty:i4,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate262.errors : vErrors.concat(validate262.errors);
errors = vErrors.length;
}
}
}
else {
const err31 = {instancePath:instancePath+"/finds",schemaPath:"#/properties/finds/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err31];
}
else {
vErrors.push(err31);
}
errors++;
}
}
if(data.next !== undefined){
let data23 = data.next;
if(Array.isArray(data23)){
if(data23.length > 30){
const err32 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err32];
}
else {
vErrors.push(err32);
}
errors++;
}
const len5 = data23.length;
for(let i5=0; i5<len5; i5++){
if(!(validate136(data23[i5], {instancePath:instancePath+"/next/" + i5,parentData:data23,parentDataProperty:i5,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate136.errors : vErrors.concat(validate136.errors);
errors = vErrors.length;
}
}
}
else {
const err33 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err33];
}
else {
vErrors.push(err33);
}
errors++;
}
}
if(data.otherwise !== undefined){
if(!(validate106(data.otherwise, {instancePath:instancePath+"/otherwise",parentData:data,parentDataProperty:"otherwise",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
if(data.results !== undefined){
let data26 = data.results;
if(Array.isArray(data26)){
if(data26.length > 30){
const err34 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err34];
}
else {
vErrors.push(err34);
}
errors++;
}
const len6 = data26.length;
for(let i6=0; i6<len6; i6++){
if(!(validate143(data26[i6], {instancePath:instancePath+"/results/" + i6,parentData:data26,parentDataProperty:i6,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate143.errors : vErrors.concat(validate143.errors);
errors = vErrors.length;
}
}
}
else {
const err35 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err35];
}
else {
vErrors.push(err35);
}
errors++;
}
}
if(data.cannotMeasure !== undefined){
if(!(validate106(data.cannotMeasure, {instancePath:instancePath+"/cannotMeasure",parentData:data,parentDataProperty:"cannotMeasure",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
}
else {
const err36 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err36];
}
else {
vErrors.push(err36);
}
errors++;
}
validate410.errors = vErrors;
return errors === 0;
}
validate410.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema72 = {"type":"object","properties":{"kind":{"const":"photo"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"cannotMeasure":{"$ref":"#/$defs/exit"},"name":{"$ref":"#/$defs/name"},"shows":{"type":"array","items":{"$ref":"#/$defs/line"},"minItems":1,"maxItems":10}},"required":["id","number","title","action","kind","otherwise","cannotMeasure","name","shows"],"additionalProperties":false};

function validate429(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate429.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.id === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.number === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "number"},message:"must have required property '"+"number"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.title === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "title"},message:"must have required property '"+"title"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.action === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "action"},message:"must have required property '"+"action"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.kind === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "kind"},message:"must have required property '"+"kind"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(data.otherwise === undefined){
const err5 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "otherwise"},message:"must have required property '"+"otherwise"+"'"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
if(data.cannotMeasure === undefined){
const err6 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "cannotMeasure"},message:"must have required property '"+"cannotMeasure"+"'"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(data.name === undefined){
const err7 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
if(data.shows === undefined){
const err8 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "shows"},message:"must have required property '"+"shows"+"'"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
for(const key0 in data){
if(!(func1.call(schema72.properties, key0))){
const err9 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
}
if(data.kind !== undefined){
if("photo" !== data.kind){
const err10 = {instancePath:instancePath+"/kind",schemaPath:"#/properties/kind/const",keyword:"const",params:{allowedValue: "photo"},message:"must be equal to constant"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
if(data.id !== undefined){
if(!(validate84(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.number !== undefined){
let data2 = data.number;
if(typeof data2 === "string"){
if(func2(data2) > 8){
const err11 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/maxLength",keyword:"maxLength",params:{limit: 8},message:"must NOT have more than 8 characters"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
if(!pattern9.test(data2)){
const err12 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z0-9]+$"},message:"must match pattern \""+"^[A-Za-z0-9]+$"+"\""};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
}
else {
const err13 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
}
if(data.title !== undefined){
if(!(validate55(data.title, {instancePath:instancePath+"/title",parentData:data,parentDataProperty:"title",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.action !== undefined){
if(!(validate61(data.action, {instancePath:instancePath+"/action",parentData:data,parentDataProperty:"action",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.short !== undefined){
if(!(validate55(data.short, {instancePath:instancePath+"/short",parentData:data,parentDataProperty:"short",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.notes !== undefined){
let data6 = data.notes;
if(Array.isArray(data6)){
if(data6.length > 10){
const err14 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/maxItems",keyword:"maxItems",params:{limit: 10},message:"must NOT have more than 10 items"};
if(vErrors === null){
vErrors = [err14];
}
else {
vErrors.push(err14);
}
errors++;
}
if(data6.length < 1){
const err15 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err15];
}
else {
vErrors.push(err15);
}
errors++;
}
const len0 = data6.length;
for(let i0=0; i0<len0; i0++){
if(!(validate57(data6[i0], {instancePath:instancePath+"/notes/" + i0,parentData:data6,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
}
else {
const err16 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err16];
}
else {
vErrors.push(err16);
}
errors++;
}
}
if(data.why !== undefined){
if(!(validate57(data.why, {instancePath:instancePath+"/why",parentData:data,parentDataProperty:"why",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.cautions !== undefined){
let data9 = data.cautions;
if(Array.isArray(data9)){
if(data9.length > 12){
const err17 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err17];
}
else {
vErrors.push(err17);
}
errors++;
}
const len1 = data9.length;
for(let i1=0; i1<len1; i1++){
if(!(validate92(data9[i1], {instancePath:instancePath+"/cautions/" + i1,parentData:data9,parentDataProperty:i1,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate92.errors : vErrors.concat(validate92.errors);
errors = vErrors.length;
}
}
}
else {
const err18 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err18];
}
else {
vErrors.push(err18);
}
errors++;
}
}
if(data.picture !== undefined){
if(!(validate120(data.picture, {instancePath:instancePath+"/picture",parentData:data,parentDataProperty:"picture",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate120.errors : vErrors.concat(validate120.errors);
errors = vErrors.length;
}
}
if(data.disturbs !== undefined){
let data12 = data.disturbs;
if(Array.isArray(data12)){
if(data12.length > 12){
const err19 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err19];
}
else {
vErrors.push(err19);
}
errors++;
}
if(data12.length < 1){
const err20 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err20];
}
else {
vErrors.push(err20);
}
errors++;
}
const len2 = data12.length;
for(let i2=0; i2<len2; i2++){
if(!(validate125(data12[i2], {instancePath:instancePath+"/disturbs/" + i2,parentData:data12,parentDataProperty:i2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate125.errors : vErrors.concat(validate125.errors);
errors = vErrors.length;
}
}
}
else {
const err21 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err21];
}
else {
vErrors.push(err21);
}
errors++;
}
}
if(data.stay !== undefined){
if(typeof data.stay !== "boolean"){
const err22 = {instancePath:instancePath+"/stay",schemaPath:"#/properties/stay/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err22];
}
else {
vErrors.push(err22);
}
errors++;
}
}
if(data.release !== undefined){
if(!(validate130(data.release, {instancePath:instancePath+"/release",parentData:data,parentDataProperty:"release",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate130.errors : vErrors.concat(validate130.errors);
errors = vErrors.length;
}
}
if(data.verify !== undefined){
if(!(validate133(data.verify, {instancePath:instancePath+"/verify",parentData:data,parentDataProperty:"verify",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate133.errors : vErrors.concat(validate133.errors);
errors = vErrors.length;
}
}
if(data.next !== undefined){
let data17 = data.next;
if(Array.isArray(data17)){
if(data17.length > 30){
const err23 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err23];
}
else {
vErrors.push(err23);
}
errors++;
}
const len3 = data17.length;
for(let i3=0; i3<len3; i3++){
if(!(validate136(data17[i3], {instancePath:instancePath+"/next/" + i3,parentData:data17,parentDataProperty:i3,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate136.errors : vErrors.concat(validate136.errors);
errors = vErrors.length;
}
}
}
else {
const err24 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err24];
}
else {
vErrors.push(err24);
}
errors++;
}
}
if(data.otherwise !== undefined){
if(!(validate106(data.otherwise, {instancePath:instancePath+"/otherwise",parentData:data,parentDataProperty:"otherwise",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
if(data.results !== undefined){
let data20 = data.results;
if(Array.isArray(data20)){
if(data20.length > 30){
const err25 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err25];
}
else {
vErrors.push(err25);
}
errors++;
}
const len4 = data20.length;
for(let i4=0; i4<len4; i4++){
if(!(validate143(data20[i4], {instancePath:instancePath+"/results/" + i4,parentData:data20,parentDataProperty:i4,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate143.errors : vErrors.concat(validate143.errors);
errors = vErrors.length;
}
}
}
else {
const err26 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err26];
}
else {
vErrors.push(err26);
}
errors++;
}
}
if(data.cannotMeasure !== undefined){
if(!(validate106(data.cannotMeasure, {instancePath:instancePath+"/cannotMeasure",parentData:data,parentDataProperty:"cannotMeasure",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
if(data.name !== undefined){
if(!(validate66(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.shows !== undefined){
let data24 = data.shows;
if(Array.isArray(data24)){
if(data24.length > 10){
const err27 = {instancePath:instancePath+"/shows",schemaPath:"#/properties/shows/maxItems",keyword:"maxItems",params:{limit: 10},message:"must NOT have more than 10 items"};
if(vErrors === null){
vErrors = [err27];
}
else {
vErrors.push(err27);
}
errors++;
}
if(data24.length < 1){
const err28 = {instancePath:instancePath+"/shows",schemaPath:"#/properties/shows/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err28];
}
else {
vErrors.push(err28);
}
errors++;
}
const len5 = data24.length;
for(let i5=0; i5<len5; i5++){
if(!(validate61(data24[i5], {instancePath:instancePath+"/shows/" + i5,parentData:data24,parentDataProperty:i5,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
}
else {
const err29 = {instancePath:instancePath+"/shows",schemaPath:"#/properties/shows/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err29];
}
else {
vErrors.push(err29);
}
errors++;
}
}
}
else {
const err30 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err30];
}
else {
vErrors.push(err30);
}
errors++;
}
validate429.errors = vErrors;
return errors === 0;
}
validate429.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema73 = {"type":"object","properties":{"kind":{"const":"call"},"id":{"$ref":"#/$defs/identifier"},"number":{"description":"As people say it: 11, 16a.","type":"string","pattern":"^[A-Za-z0-9]+$","maxLength":8},"title":{"$ref":"#/$defs/label"},"action":{"$ref":"#/$defs/line"},"short":{"$ref":"#/$defs/label"},"notes":{"type":"array","items":{"$ref":"#/$defs/paragraph"},"minItems":1,"maxItems":10},"why":{"$ref":"#/$defs/paragraph"},"cautions":{"type":"array","items":{"$ref":"#/$defs/caution"},"maxItems":12},"picture":{"$ref":"#/$defs/picture"},"disturbs":{"type":"array","items":{"$ref":"#/$defs/disturbed"},"minItems":1,"maxItems":12},"stay":{"type":"boolean"},"release":{"$ref":"#/$defs/releasePoint"},"verify":{"$ref":"#/$defs/verification"},"next":{"type":"array","items":{"$ref":"#/$defs/branch"},"maxItems":30},"otherwise":{"$ref":"#/$defs/exit"},"results":{"type":"array","items":{"$ref":"#/$defs/result"},"maxItems":30},"procedure":{"$ref":"#/$defs/procedureId"},"version":{"type":"integer","minimum":1,"maximum":100000},"takes":{"type":"array","items":{"$ref":"#/$defs/takenResult"},"maxItems":30},"finds":{"type":"array","items":{"$ref":"#/$defs/calledFinding"},"maxItems":30}},"required":["id","number","title","action","kind","otherwise","procedure","version","takes","finds"],"additionalProperties":false};
const schema74 = {"type":"object","properties":{"name":{"$ref":"#/$defs/name"},"label":{"$ref":"#/$defs/label"},"unit":{"$ref":"#/$defs/unit"},"sense":{"$ref":"#/$defs/sense"},"band":{"$ref":"#/$defs/band"},"from":{"$ref":"#/$defs/name"}},"required":["name","label","unit","from"],"additionalProperties":false};

function validate463(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate463.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.name === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.label === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "label"},message:"must have required property '"+"label"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.unit === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "unit"},message:"must have required property '"+"unit"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.from === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "from"},message:"must have required property '"+"from"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
for(const key0 in data){
if(!((((((key0 === "name") || (key0 === "label")) || (key0 === "unit")) || (key0 === "sense")) || (key0 === "band")) || (key0 === "from"))){
const err4 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
}
if(data.name !== undefined){
if(!(validate66(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.label !== undefined){
if(!(validate55(data.label, {instancePath:instancePath+"/label",parentData:data,parentDataProperty:"label",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.unit !== undefined){
if(!(validate71(data.unit, {instancePath:instancePath+"/unit",parentData:data,parentDataProperty:"unit",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate71.errors : vErrors.concat(validate71.errors);
errors = vErrors.length;
}
}
if(data.sense !== undefined){
if(!(validate78(data.sense, {instancePath:instancePath+"/sense",parentData:data,parentDataProperty:"sense",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate78.errors : vErrors.concat(validate78.errors);
errors = vErrors.length;
}
}
if(data.band !== undefined){
if(!(validate148(data.band, {instancePath:instancePath+"/band",parentData:data,parentDataProperty:"band",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate148.errors : vErrors.concat(validate148.errors);
errors = vErrors.length;
}
}
if(data.from !== undefined){
if(!(validate66(data.from, {instancePath:instancePath+"/from",parentData:data,parentDataProperty:"from",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err5 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
validate463.errors = vErrors;
return errors === 0;
}
validate463.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

const schema75 = {"type":"object","properties":{"finding":{"$ref":"#/$defs/name"},"name":{"$ref":"#/$defs/name"}},"required":["finding","name"],"additionalProperties":false};

function validate471(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate471.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.finding === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "finding"},message:"must have required property '"+"finding"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.name === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "name"},message:"must have required property '"+"name"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
for(const key0 in data){
if(!((key0 === "finding") || (key0 === "name"))){
const err2 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
if(data.finding !== undefined){
if(!(validate66(data.finding, {instancePath:instancePath+"/finding",parentData:data,parentDataProperty:"finding",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
if(data.name !== undefined){
if(!(validate66(data.name, {instancePath:instancePath+"/name",parentData:data,parentDataProperty:"name",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate66.errors : vErrors.concat(validate66.errors);
errors = vErrors.length;
}
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate471.errors = vErrors;
return errors === 0;
}
validate471.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};


function validate447(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate447.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.id === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.number === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "number"},message:"must have required property '"+"number"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.title === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "title"},message:"must have required property '"+"title"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.action === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "action"},message:"must have required property '"+"action"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.kind === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "kind"},message:"must have required property '"+"kind"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(data.otherwise === undefined){
const err5 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "otherwise"},message:"must have required property '"+"otherwise"+"'"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
if(data.procedure === undefined){
const err6 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "procedure"},message:"must have required property '"+"procedure"+"'"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(data.version === undefined){
const err7 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "version"},message:"must have required property '"+"version"+"'"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
if(data.takes === undefined){
const err8 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "takes"},message:"must have required property '"+"takes"+"'"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
if(data.finds === undefined){
const err9 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "finds"},message:"must have required property '"+"finds"+"'"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
for(const key0 in data){
if(!(func1.call(schema73.properties, key0))){
const err10 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
}
if(data.kind !== undefined){
if("call" !== data.kind){
const err11 = {instancePath:instancePath+"/kind",schemaPath:"#/properties/kind/const",keyword:"const",params:{allowedValue: "call"},message:"must be equal to constant"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
}
if(data.id !== undefined){
if(!(validate84(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
if(data.number !== undefined){
let data2 = data.number;
if(typeof data2 === "string"){
if(func2(data2) > 8){
const err12 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/maxLength",keyword:"maxLength",params:{limit: 8},message:"must NOT have more than 8 characters"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
if(!pattern9.test(data2)){
const err13 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/pattern",keyword:"pattern",params:{pattern: "^[A-Za-z0-9]+$"},message:"must match pattern \""+"^[A-Za-z0-9]+$"+"\""};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
}
else {
const err14 = {instancePath:instancePath+"/number",schemaPath:"#/properties/number/type",keyword:"type",params:{type: "string"},message:"must be string"};
if(vErrors === null){
vErrors = [err14];
}
else {
vErrors.push(err14);
}
errors++;
}
}
if(data.title !== undefined){
if(!(validate55(data.title, {instancePath:instancePath+"/title",parentData:data,parentDataProperty:"title",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.action !== undefined){
if(!(validate61(data.action, {instancePath:instancePath+"/action",parentData:data,parentDataProperty:"action",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
if(data.short !== undefined){
if(!(validate55(data.short, {instancePath:instancePath+"/short",parentData:data,parentDataProperty:"short",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.notes !== undefined){
let data6 = data.notes;
if(Array.isArray(data6)){
if(data6.length > 10){
const err15 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/maxItems",keyword:"maxItems",params:{limit: 10},message:"must NOT have more than 10 items"};
if(vErrors === null){
vErrors = [err15];
}
else {
vErrors.push(err15);
}
errors++;
}
if(data6.length < 1){
const err16 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err16];
}
else {
vErrors.push(err16);
}
errors++;
}
const len0 = data6.length;
for(let i0=0; i0<len0; i0++){
if(!(validate57(data6[i0], {instancePath:instancePath+"/notes/" + i0,parentData:data6,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
}
else {
const err17 = {instancePath:instancePath+"/notes",schemaPath:"#/properties/notes/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err17];
}
else {
vErrors.push(err17);
}
errors++;
}
}
if(data.why !== undefined){
if(!(validate57(data.why, {instancePath:instancePath+"/why",parentData:data,parentDataProperty:"why",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.cautions !== undefined){
let data9 = data.cautions;
if(Array.isArray(data9)){
if(data9.length > 12){
const err18 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err18];
}
else {
vErrors.push(err18);
}
errors++;
}
const len1 = data9.length;
for(let i1=0; i1<len1; i1++){
if(!(validate92(data9[i1], {instancePath:instancePath+"/cautions/" + i1,parentData:data9,parentDataProperty:i1,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate92.errors : vErrors.concat(validate92.errors);
errors = vErrors.length;
}
}
}
else {
const err19 = {instancePath:instancePath+"/cautions",schemaPath:"#/properties/cautions/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err19];
}
else {
vErrors.push(err19);
}
errors++;
}
}
if(data.picture !== undefined){
if(!(validate120(data.picture, {instancePath:instancePath+"/picture",parentData:data,parentDataProperty:"picture",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate120.errors : vErrors.concat(validate120.errors);
errors = vErrors.length;
}
}
if(data.disturbs !== undefined){
let data12 = data.disturbs;
if(Array.isArray(data12)){
if(data12.length > 12){
const err20 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/maxItems",keyword:"maxItems",params:{limit: 12},message:"must NOT have more than 12 items"};
if(vErrors === null){
vErrors = [err20];
}
else {
vErrors.push(err20);
}
errors++;
}
if(data12.length < 1){
const err21 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/minItems",keyword:"minItems",params:{limit: 1},message:"must NOT have fewer than 1 items"};
if(vErrors === null){
vErrors = [err21];
}
else {
vErrors.push(err21);
}
errors++;
}
const len2 = data12.length;
for(let i2=0; i2<len2; i2++){
if(!(validate125(data12[i2], {instancePath:instancePath+"/disturbs/" + i2,parentData:data12,parentDataProperty:i2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate125.errors : vErrors.concat(validate125.errors);
errors = vErrors.length;
}
}
}
else {
const err22 = {instancePath:instancePath+"/disturbs",schemaPath:"#/properties/disturbs/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err22];
}
else {
vErrors.push(err22);
}
errors++;
}
}
if(data.stay !== undefined){
if(typeof data.stay !== "boolean"){
const err23 = {instancePath:instancePath+"/stay",schemaPath:"#/properties/stay/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err23];
}
else {
vErrors.push(err23);
}
errors++;
}
}
if(data.release !== undefined){
if(!(validate130(data.release, {instancePath:instancePath+"/release",parentData:data,parentDataProperty:"release",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate130.errors : vErrors.concat(validate130.errors);
errors = vErrors.length;
}
}
if(data.verify !== undefined){
if(!(validate133(data.verify, {instancePath:instancePath+"/verify",parentData:data,parentDataProperty:"verify",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate133.errors : vErrors.concat(validate133.errors);
errors = vErrors.length;
}
}
if(data.next !== undefined){
let data17 = data.next;
if(Array.isArray(data17)){
if(data17.length > 30){
const err24 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err24];
}
else {
vErrors.push(err24);
}
errors++;
}
const len3 = data17.length;
for(let i3=0; i3<len3; i3++){
if(!(validate136(data17[i3], {instancePath:instancePath+"/next/" + i3,parentData:data17,parentDataProperty:i3,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate136.errors : vErrors.concat(validate136.errors);
errors = vErrors.length;
}
}
}
else {
const err25 = {instancePath:instancePath+"/next",schemaPath:"#/properties/next/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err25];
}
else {
vErrors.push(err25);
}
errors++;
}
}
if(data.otherwise !== undefined){
if(!(validate106(data.otherwise, {instancePath:instancePath+"/otherwise",parentData:data,parentDataProperty:"otherwise",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate106.errors : vErrors.concat(validate106.errors);
errors = vErrors.length;
}
}
if(data.results !== undefined){
let data20 = data.results;
if(Array.isArray(data20)){
if(data20.length > 30){
const err26 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err26];
}
else {
vErrors.push(err26);
}
errors++;
}
const len4 = data20.length;
for(let i4=0; i4<len4; i4++){
if(!(validate143(data20[i4], {instancePath:instancePath+"/results/" + i4,parentData:data20,parentDataProperty:i4,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate143.errors : vErrors.concat(validate143.errors);
errors = vErrors.length;
}
}
}
else {
const err27 = {instancePath:instancePath+"/results",schemaPath:"#/properties/results/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err27];
}
else {
vErrors.push(err27);
}
errors++;
}
}
if(data.procedure !== undefined){
if(!(validate53(data.procedure, {instancePath:instancePath+"/procedure",parentData:data,parentDataProperty:"procedure",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate53.errors : vErrors.concat(validate53.errors);
errors = vErrors.length;
}
}
if(data.version !== undefined){
let data23 = data.version;
if(!(((typeof data23 == "number") && (!(data23 % 1) && !isNaN(data23))) && (isFinite(data23)))){
const err28 = {instancePath:instancePath+"/version",schemaPath:"#/properties/version/type",keyword:"type",params:{type: "integer"},message:"must be integer"};
if(vErrors === null){
vErrors = [err28];
}
else {
vErrors.push(err28);
}
errors++;
}
if((typeof data23 == "number") && (isFinite(data23))){
if(data23 > 100000 || isNaN(data23)){
const err29 = {instancePath:instancePath+"/version",schemaPath:"#/properties/version/maximum",keyword:"maximum",params:{comparison: "<=", limit: 100000},message:"must be <= 100000"};
if(vErrors === null){
vErrors = [err29];
}
else {
vErrors.push(err29);
}
errors++;
}
if(data23 < 1 || isNaN(data23)){
const err30 = {instancePath:instancePath+"/version",schemaPath:"#/properties/version/minimum",keyword:"minimum",params:{comparison: ">=", limit: 1},message:"must be >= 1"};
if(vErrors === null){
vErrors = [err30];
}
else {
vErrors.push(err30);
}
errors++;
}
}
}
if(data.takes !== undefined){
let data24 = data.takes;
if(Array.isArray(data24)){
if(data24.length > 30){
const err31 = {instancePath:instancePath+"/takes",schemaPath:"#/properties/takes/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err31];
}
else {
vErrors.push(err31);
}
errors++;
}
const len5 = data24.length;
for(let i5=0; i5<len5; i5++){
if(!(validate463(data24[i5], {instancePath:instancePath+"/takes/" + i5,parentData:data24,parentDataProperty:i5,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate463.errors : vErrors.concat(validate463.errors);
errors = vErrors.length;
}
}
}
else {
const err32 = {instancePath:instancePath+"/takes",schemaPath:"#/properties/takes/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err32];
}
else {
vErrors.push(err32);
}
errors++;
}
}
if(data.finds !== undefined){
let data26 = data.finds;
if(Array.isArray(data26)){
if(data26.length > 30){
const err33 = {instancePath:instancePath+"/finds",schemaPath:"#/properties/finds/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err33];
}
else {
vErrors.push(err33);
}
errors++;
}
const len6 = data26.length;
for(let i6=0; i6<len6; i6++){
if(!(validate471(data26[i6], {instancePath:instancePath+"/finds/" + i6,parentData:data26,parentDataProperty:i6,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate471.errors : vErrors.concat(validate471.errors);
errors = vErrors.length;
}
}
}
else {
const err34 = {instancePath:instancePath+"/finds",schemaPath:"#/properties/finds/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err34];
}
else {
vErrors.push(err34);
}
errors++;
}
}
}
else {
const err35 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err35];
}
else {
vErrors.push(err35);
}
errors++;
}
validate447.errors = vErrors;
return errors === 0;
}
validate447.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};


function validate111(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
let vErrors = null;
let errors = 0;
const evaluated0 = validate111.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.kind === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "kind"},message:"must have required property '"+"kind"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
const tag0 = data.kind;
if(typeof tag0 == "string"){
if(tag0 === "start"){
if(!(validate112(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate112.errors : vErrors.concat(validate112.errors);
errors = vErrors.length;
}
var props0 = true;
}
else if(tag0 === "action"){
if(!(validate157(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate157.errors : vErrors.concat(validate157.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else if(tag0 === "reading"){
if(!(validate172(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate172.errors : vErrors.concat(validate172.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else if(tag0 === "choice"){
if(!(validate217(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate217.errors : vErrors.concat(validate217.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else if(tag0 === "listen"){
if(!(validate240(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate240.errors : vErrors.concat(validate240.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else if(tag0 === "hold"){
if(!(validate281(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate281.errors : vErrors.concat(validate281.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else if(tag0 === "wait"){
if(!(validate300(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate300.errors : vErrors.concat(validate300.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else if(tag0 === "codes"){
if(!(validate319(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate319.errors : vErrors.concat(validate319.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else if(tag0 === "drive"){
if(!(validate338(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate338.errors : vErrors.concat(validate338.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else if(tag0 === "compute"){
if(!(validate360(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate360.errors : vErrors.concat(validate360.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else if(tag0 === "restore"){
if(!(validate375(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate375.errors : vErrors.concat(validate375.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else if(tag0 === "finding"){
if(!(validate390(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate390.errors : vErrors.concat(validate390.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else if(tag0 === "ramp"){
if(!(validate410(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate410.errors : vErrors.concat(validate410.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else if(tag0 === "photo"){
if(!(validate429(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate429.errors : vErrors.concat(validate429.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else if(tag0 === "call"){
if(!(validate447(data, {instancePath,parentData,parentDataProperty,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate447.errors : vErrors.concat(validate447.errors);
errors = vErrors.length;
}
if(props0 !== true){
props0 = true;
}
}
else {
const err1 = {instancePath,schemaPath:"#/discriminator",keyword:"discriminator",params:{error: "mapping", tag: "kind", tagValue: tag0},message:"value of tag \"kind\" must be in oneOf"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
}
else {
const err2 = {instancePath,schemaPath:"#/discriminator",keyword:"discriminator",params:{error: "tag", tag: "kind", tagValue: tag0},message:"tag \"kind\" must be string"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
}
else {
const err3 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
validate111.errors = vErrors;
evaluated0.props = props0;
return errors === 0;
}
validate111.evaluated = {"dynamicProps":true,"dynamicItems":false};


function validate52(data, {instancePath="", parentData, parentDataProperty, rootData=data, dynamicAnchors={}}={}){
/*# sourceURL="procedure-document.schema.json" */;
let vErrors = null;
let errors = 0;
const evaluated0 = validate52.evaluated;
if(evaluated0.dynamicProps){
evaluated0.props = undefined;
}
if(evaluated0.dynamicItems){
evaluated0.items = undefined;
}
if(data && typeof data == "object" && !Array.isArray(data)){
if(data.format === undefined){
const err0 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "format"},message:"must have required property '"+"format"+"'"};
if(vErrors === null){
vErrors = [err0];
}
else {
vErrors.push(err0);
}
errors++;
}
if(data.id === undefined){
const err1 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "id"},message:"must have required property '"+"id"+"'"};
if(vErrors === null){
vErrors = [err1];
}
else {
vErrors.push(err1);
}
errors++;
}
if(data.title === undefined){
const err2 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "title"},message:"must have required property '"+"title"+"'"};
if(vErrors === null){
vErrors = [err2];
}
else {
vErrors.push(err2);
}
errors++;
}
if(data.purpose === undefined){
const err3 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "purpose"},message:"must have required property '"+"purpose"+"'"};
if(vErrors === null){
vErrors = [err3];
}
else {
vErrors.push(err3);
}
errors++;
}
if(data.system === undefined){
const err4 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "system"},message:"must have required property '"+"system"+"'"};
if(vErrors === null){
vErrors = [err4];
}
else {
vErrors.push(err4);
}
errors++;
}
if(data.appliesTo === undefined){
const err5 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "appliesTo"},message:"must have required property '"+"appliesTo"+"'"};
if(vErrors === null){
vErrors = [err5];
}
else {
vErrors.push(err5);
}
errors++;
}
if(data.expectedMinutes === undefined){
const err6 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "expectedMinutes"},message:"must have required property '"+"expectedMinutes"+"'"};
if(vErrors === null){
vErrors = [err6];
}
else {
vErrors.push(err6);
}
errors++;
}
if(data.useLevel === undefined){
const err7 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "useLevel"},message:"must have required property '"+"useLevel"+"'"};
if(vErrors === null){
vErrors = [err7];
}
else {
vErrors.push(err7);
}
errors++;
}
if(data.gear === undefined){
const err8 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "gear"},message:"must have required property '"+"gear"+"'"};
if(vErrors === null){
vErrors = [err8];
}
else {
vErrors.push(err8);
}
errors++;
}
if(data.inputs === undefined){
const err9 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "inputs"},message:"must have required property '"+"inputs"+"'"};
if(vErrors === null){
vErrors = [err9];
}
else {
vErrors.push(err9);
}
errors++;
}
if(data.pictures === undefined){
const err10 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "pictures"},message:"must have required property '"+"pictures"+"'"};
if(vErrors === null){
vErrors = [err10];
}
else {
vErrors.push(err10);
}
errors++;
}
if(data.references === undefined){
const err11 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "references"},message:"must have required property '"+"references"+"'"};
if(vErrors === null){
vErrors = [err11];
}
else {
vErrors.push(err11);
}
errors++;
}
if(data.deference === undefined){
const err12 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "deference"},message:"must have required property '"+"deference"+"'"};
if(vErrors === null){
vErrors = [err12];
}
else {
vErrors.push(err12);
}
errors++;
}
if(data.start === undefined){
const err13 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "start"},message:"must have required property '"+"start"+"'"};
if(vErrors === null){
vErrors = [err13];
}
else {
vErrors.push(err13);
}
errors++;
}
if(data.limits === undefined){
const err14 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "limits"},message:"must have required property '"+"limits"+"'"};
if(vErrors === null){
vErrors = [err14];
}
else {
vErrors.push(err14);
}
errors++;
}
if(data.stop === undefined){
const err15 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "stop"},message:"must have required property '"+"stop"+"'"};
if(vErrors === null){
vErrors = [err15];
}
else {
vErrors.push(err15);
}
errors++;
}
if(data.steps === undefined){
const err16 = {instancePath,schemaPath:"#/required",keyword:"required",params:{missingProperty: "steps"},message:"must have required property '"+"steps"+"'"};
if(vErrors === null){
vErrors = [err16];
}
else {
vErrors.push(err16);
}
errors++;
}
for(const key0 in data){
if(!(func1.call(schema19.properties, key0))){
const err17 = {instancePath,schemaPath:"#/additionalProperties",keyword:"additionalProperties",params:{additionalProperty: key0},message:"must NOT have additional properties"};
if(vErrors === null){
vErrors = [err17];
}
else {
vErrors.push(err17);
}
errors++;
}
}
if(data.format !== undefined){
if(1 !== data.format){
const err18 = {instancePath:instancePath+"/format",schemaPath:"#/properties/format/const",keyword:"const",params:{allowedValue: 1},message:"must be equal to constant"};
if(vErrors === null){
vErrors = [err18];
}
else {
vErrors.push(err18);
}
errors++;
}
}
if(data.id !== undefined){
if(!(validate53(data.id, {instancePath:instancePath+"/id",parentData:data,parentDataProperty:"id",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate53.errors : vErrors.concat(validate53.errors);
errors = vErrors.length;
}
}
if(data.title !== undefined){
if(!(validate55(data.title, {instancePath:instancePath+"/title",parentData:data,parentDataProperty:"title",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.purpose !== undefined){
if(!(validate57(data.purpose, {instancePath:instancePath+"/purpose",parentData:data,parentDataProperty:"purpose",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.system !== undefined){
if(!(validate55(data.system, {instancePath:instancePath+"/system",parentData:data,parentDataProperty:"system",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate55.errors : vErrors.concat(validate55.errors);
errors = vErrors.length;
}
}
if(data.appliesTo !== undefined){
if(!(validate60(data.appliesTo, {instancePath:instancePath+"/appliesTo",parentData:data,parentDataProperty:"appliesTo",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate60.errors : vErrors.concat(validate60.errors);
errors = vErrors.length;
}
}
if(data.expectedMinutes !== undefined){
let data6 = data.expectedMinutes;
if(!(((typeof data6 == "number") && (!(data6 % 1) && !isNaN(data6))) && (isFinite(data6)))){
const err19 = {instancePath:instancePath+"/expectedMinutes",schemaPath:"#/properties/expectedMinutes/type",keyword:"type",params:{type: "integer"},message:"must be integer"};
if(vErrors === null){
vErrors = [err19];
}
else {
vErrors.push(err19);
}
errors++;
}
if((typeof data6 == "number") && (isFinite(data6))){
if(data6 > 1440 || isNaN(data6)){
const err20 = {instancePath:instancePath+"/expectedMinutes",schemaPath:"#/properties/expectedMinutes/maximum",keyword:"maximum",params:{comparison: "<=", limit: 1440},message:"must be <= 1440"};
if(vErrors === null){
vErrors = [err20];
}
else {
vErrors.push(err20);
}
errors++;
}
if(data6 < 1 || isNaN(data6)){
const err21 = {instancePath:instancePath+"/expectedMinutes",schemaPath:"#/properties/expectedMinutes/minimum",keyword:"minimum",params:{comparison: ">=", limit: 1},message:"must be >= 1"};
if(vErrors === null){
vErrors = [err21];
}
else {
vErrors.push(err21);
}
errors++;
}
}
}
if(data.useLevel !== undefined){
let data7 = data.useLevel;
if(!((data7 === "every-step") || (data7 === "consulted"))){
const err22 = {instancePath:instancePath+"/useLevel",schemaPath:"#/properties/useLevel/enum",keyword:"enum",params:{allowedValues: schema19.properties.useLevel.enum},message:"must be equal to one of the allowed values"};
if(vErrors === null){
vErrors = [err22];
}
else {
vErrors.push(err22);
}
errors++;
}
}
if(data.pair !== undefined){
if(typeof data.pair !== "boolean"){
const err23 = {instancePath:instancePath+"/pair",schemaPath:"#/properties/pair/type",keyword:"type",params:{type: "boolean"},message:"must be boolean"};
if(vErrors === null){
vErrors = [err23];
}
else {
vErrors.push(err23);
}
errors++;
}
}
if(data.gear !== undefined){
let data9 = data.gear;
if(Array.isArray(data9)){
if(data9.length > 30){
const err24 = {instancePath:instancePath+"/gear",schemaPath:"#/properties/gear/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err24];
}
else {
vErrors.push(err24);
}
errors++;
}
const len0 = data9.length;
for(let i0=0; i0<len0; i0++){
if(!(validate65(data9[i0], {instancePath:instancePath+"/gear/" + i0,parentData:data9,parentDataProperty:i0,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate65.errors : vErrors.concat(validate65.errors);
errors = vErrors.length;
}
}
}
else {
const err25 = {instancePath:instancePath+"/gear",schemaPath:"#/properties/gear/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err25];
}
else {
vErrors.push(err25);
}
errors++;
}
}
if(data.inputs !== undefined){
let data11 = data.inputs;
if(Array.isArray(data11)){
if(data11.length > 100){
const err26 = {instancePath:instancePath+"/inputs",schemaPath:"#/properties/inputs/maxItems",keyword:"maxItems",params:{limit: 100},message:"must NOT have more than 100 items"};
if(vErrors === null){
vErrors = [err26];
}
else {
vErrors.push(err26);
}
errors++;
}
const len1 = data11.length;
for(let i1=0; i1<len1; i1++){
if(!(validate74(data11[i1], {instancePath:instancePath+"/inputs/" + i1,parentData:data11,parentDataProperty:i1,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate74.errors : vErrors.concat(validate74.errors);
errors = vErrors.length;
}
}
}
else {
const err27 = {instancePath:instancePath+"/inputs",schemaPath:"#/properties/inputs/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err27];
}
else {
vErrors.push(err27);
}
errors++;
}
}
if(data.pictures !== undefined){
let data13 = data.pictures;
if(Array.isArray(data13)){
if(data13.length > 30){
const err28 = {instancePath:instancePath+"/pictures",schemaPath:"#/properties/pictures/maxItems",keyword:"maxItems",params:{limit: 30},message:"must NOT have more than 30 items"};
if(vErrors === null){
vErrors = [err28];
}
else {
vErrors.push(err28);
}
errors++;
}
const len2 = data13.length;
for(let i2=0; i2<len2; i2++){
if(!(validate84(data13[i2], {instancePath:instancePath+"/pictures/" + i2,parentData:data13,parentDataProperty:i2,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate84.errors : vErrors.concat(validate84.errors);
errors = vErrors.length;
}
}
}
else {
const err29 = {instancePath:instancePath+"/pictures",schemaPath:"#/properties/pictures/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err29];
}
else {
vErrors.push(err29);
}
errors++;
}
}
if(data.references !== undefined){
let data15 = data.references;
if(Array.isArray(data15)){
if(data15.length > 50){
const err30 = {instancePath:instancePath+"/references",schemaPath:"#/properties/references/maxItems",keyword:"maxItems",params:{limit: 50},message:"must NOT have more than 50 items"};
if(vErrors === null){
vErrors = [err30];
}
else {
vErrors.push(err30);
}
errors++;
}
const len3 = data15.length;
for(let i3=0; i3<len3; i3++){
if(!(validate61(data15[i3], {instancePath:instancePath+"/references/" + i3,parentData:data15,parentDataProperty:i3,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate61.errors : vErrors.concat(validate61.errors);
errors = vErrors.length;
}
}
}
else {
const err31 = {instancePath:instancePath+"/references",schemaPath:"#/properties/references/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err31];
}
else {
vErrors.push(err31);
}
errors++;
}
}
if(data.deference !== undefined){
if(!(validate57(data.deference, {instancePath:instancePath+"/deference",parentData:data,parentDataProperty:"deference",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate57.errors : vErrors.concat(validate57.errors);
errors = vErrors.length;
}
}
if(data.start !== undefined){
if(!(validate88(data.start, {instancePath:instancePath+"/start",parentData:data,parentDataProperty:"start",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate88.errors : vErrors.concat(validate88.errors);
errors = vErrors.length;
}
}
if(data.limits !== undefined){
let data19 = data.limits;
if(Array.isArray(data19)){
if(data19.length > 20){
const err32 = {instancePath:instancePath+"/limits",schemaPath:"#/properties/limits/maxItems",keyword:"maxItems",params:{limit: 20},message:"must NOT have more than 20 items"};
if(vErrors === null){
vErrors = [err32];
}
else {
vErrors.push(err32);
}
errors++;
}
const len4 = data19.length;
for(let i4=0; i4<len4; i4++){
if(!(validate96(data19[i4], {instancePath:instancePath+"/limits/" + i4,parentData:data19,parentDataProperty:i4,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate96.errors : vErrors.concat(validate96.errors);
errors = vErrors.length;
}
}
}
else {
const err33 = {instancePath:instancePath+"/limits",schemaPath:"#/properties/limits/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err33];
}
else {
vErrors.push(err33);
}
errors++;
}
}
if(data.stop !== undefined){
if(!(validate104(data.stop, {instancePath:instancePath+"/stop",parentData:data,parentDataProperty:"stop",rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate104.errors : vErrors.concat(validate104.errors);
errors = vErrors.length;
}
}
if(data.steps !== undefined){
let data22 = data.steps;
if(Array.isArray(data22)){
if(data22.length > 500){
const err34 = {instancePath:instancePath+"/steps",schemaPath:"#/properties/steps/maxItems",keyword:"maxItems",params:{limit: 500},message:"must NOT have more than 500 items"};
if(vErrors === null){
vErrors = [err34];
}
else {
vErrors.push(err34);
}
errors++;
}
if(data22.length < 2){
const err35 = {instancePath:instancePath+"/steps",schemaPath:"#/properties/steps/minItems",keyword:"minItems",params:{limit: 2},message:"must NOT have fewer than 2 items"};
if(vErrors === null){
vErrors = [err35];
}
else {
vErrors.push(err35);
}
errors++;
}
const len5 = data22.length;
for(let i5=0; i5<len5; i5++){
if(!(validate111(data22[i5], {instancePath:instancePath+"/steps/" + i5,parentData:data22,parentDataProperty:i5,rootData,dynamicAnchors}))){
vErrors = vErrors === null ? validate111.errors : vErrors.concat(validate111.errors);
errors = vErrors.length;
}
}
}
else {
const err36 = {instancePath:instancePath+"/steps",schemaPath:"#/properties/steps/type",keyword:"type",params:{type: "array"},message:"must be array"};
if(vErrors === null){
vErrors = [err36];
}
else {
vErrors.push(err36);
}
errors++;
}
}
}
else {
const err37 = {instancePath,schemaPath:"#/type",keyword:"type",params:{type: "object"},message:"must be object"};
if(vErrors === null){
vErrors = [err37];
}
else {
vErrors.push(err37);
}
errors++;
}
validate52.errors = vErrors;
return errors === 0;
}
validate52.evaluated = {"props":true,"dynamicProps":false,"dynamicItems":false};

